import { parseArgs } from "node:util";
import { evaluateFormula } from "../engine/evaluate";
import { SheetError, type SheetValue } from "../engine/sheet-function";
import { refused, type CommandResult } from "./command-result";
import { csvCell } from "./csv-cell";
import { engineHere } from "./engine-here";
import { USAGE } from "./usage";

/** `wallsheet eval FORMULA` */
export function evalCommand(args: readonly string[]): CommandResult {
  // A formula may begin with a minus sign; everything that is not one of our options is the formula.
  const { values, positionals } = parseArgs({
    args: args.map((a) => (a.startsWith("-") && !/^(--(csv|json|help)|-h|--)$/.test(a) ? "=" + a : a)),
    allowPositionals: true,
    options: { csv: { type: "boolean" }, json: { type: "boolean" }, help: { type: "boolean", short: "h" } },
  });
  if (values.help) return { status: 0, out: USAGE.eval + "\n", complaints: [] };
  const [formula, ...more] = positionals;
  if (formula === undefined || formula.trim() === "" || more.length > 0) return refused("eval needs one formula, quoted; see wallsheet eval --help");
  if (values.csv && values.json) return refused("eval takes --csv or --json, not both");
  const result = evaluateFormula(engineHere(), formula);
  if (result instanceof SheetError) return { status: 1, out: "", complaints: [result.message === "" ? result.code : `${result.code} ${result.message}`] };
  const rows = Array.isArray(result) ? result : [[result]];
  const failed = rows.flat().filter((v) => v instanceof SheetError);
  const out = values.json ? JSON.stringify(Array.isArray(result) ? rows.map((r) => r.map(plain)) : plain(result)) + "\n" : rows.map((r) => r.map(values.csv ? (v) => csvCell(typeof v === "string" ? v : shown(v), typeof v === "string") : textCell).join(values.csv ? "," : "\t") + "\n").join("");
  return { status: failed.length > 0 ? 1 : 0, out, complaints: failed.map((e) => `${e.code} ${e.message}`.trim()) };
}

function plain(value: SheetValue): number | string | boolean | null {
  return value instanceof SheetError ? value.code : value;
}

function textCell(value: SheetValue): string {
  return shown(value).replace(/[\t\r\n]+/g, " ");
}

function shown(value: SheetValue): string {
  const v = plain(value);
  return v === null ? "" : typeof v === "boolean" ? (v ? "TRUE" : "FALSE") : String(v);
}
