import { parseArgs } from "node:util";
import type { CatalogueEntry } from "../cells/catalogue-entry";
import { CAUTIONS } from "../cells/cautions";
import { catalogue } from "../cells/generated/catalogue";
import { refused, type CommandResult } from "./command-result";
import { nearestFunction } from "./nearest-function";
import { USAGE } from "./usage";

/** `wallsheet list [NAME]` */
export function listCommand(args: readonly string[]): CommandResult {
  const { values, positionals } = parseArgs({ args: [...args], allowPositionals: true, options: { json: { type: "boolean" }, help: { type: "boolean", short: "h" } } });
  if (values.help) return { status: 0, out: USAGE.list + "\n", complaints: [] };
  const [name, ...more] = positionals;
  if (more.length > 0) return refused("list takes one name; see wallsheet list --help");
  if (name === undefined) return said(values.json ? JSON.stringify(catalogue, null, 2) + "\n" : overview());
  const wanted = name.toUpperCase().replace(/^=?WALL\./, "");
  const entry = catalogue.find((e) => e.name === wanted);
  if (!entry) return refused(`there is no function ${name}; the nearest is ${nearestFunction(wanted, catalogue.map((e) => e.name))}`);
  return said(values.json ? JSON.stringify(entry, null, 2) + "\n" : card(entry));
}

function said(out: string): CommandResult {
  return { status: 0, out, complaints: [] };
}

function overview(): string {
  const width = Math.max(...catalogue.map((e) => e.name.length));
  const families = [...new Set(catalogue.map((e) => e.family))];
  return families.map((family) => `${family}\n` + catalogue.filter((e) => e.family === family).map((e) => `  ${e.name.padEnd(width)}  ${e.purpose}\n`).join("")).join("\n");
}

function card(entry: CatalogueEntry): string {
  const call = entry.parameters.map((p) => (p.optional ? `[${p.name}]` : p.name)).join(", ");
  const width = Math.max(...entry.parameters.map((p) => p.name.length));
  const list = (items: readonly string[]) => items.map((i) => `  ${i}\n`).join("");
  return [
    `=WALL.${entry.name}(${call})\n\n${entry.purpose}\n`,
    "arguments\n" + entry.parameters.map((p) => `  ${p.name.padEnd(width)}  [${p.unit}]${p.optional ? " optional." : ""} ${p.description}\n`).join(""),
    `gives [${entry.resultUnit}]\n  ${entry.gives}\n`,
    "valid range and error\n" + list(entry.limits),
    "source\n" + list(entry.sources),
    "example\n" + entry.examples.map((e) => `  ${e.formula} gives ${String(e.value)}\n`).join(""),
    list(CAUTIONS).replace(/^ {2}/gm, ""),
  ].join("\n");
}
