import { readFileSync } from "node:fs";
import { parseArgs } from "node:util";
import { CAUTIONS } from "../cells/cautions";
import { WorkbookError } from "../workbook/workbook-error";
import { auditBook, hasFinding, type AuditedCell } from "./audit-book";
import { refused, type CommandResult } from "./command-result";
import { csvCell } from "./csv-cell";
import { engineHere } from "./engine-here";
import { systemWords } from "./file-words";
import { USAGE } from "./usage";

const FORMATS: Readonly<Record<string, (cells: readonly AuditedCell[]) => string>> = { table: asTable, json: (cells) => JSON.stringify(cells, null, 2) + "\n", csv: asCsv };

/** `wallsheet audit BOOK [--format table|json|csv]` */
export function auditCommand(args: readonly string[]): CommandResult {
  const { values, positionals } = parseArgs({ args: [...args], allowPositionals: true, options: { format: { type: "string", default: "table" }, quiet: { type: "boolean", short: "q" }, help: { type: "boolean", short: "h" } } });
  if (values.help) return { status: 0, out: USAGE.audit + "\n", complaints: [] };
  const [input, ...more] = positionals;
  if (input === undefined || more.length > 0) return refused("audit needs one workbook; see wallsheet audit --help");
  const write = Object.hasOwn(FORMATS, values.format) ? FORMATS[values.format] : undefined;
  if (!write) return refused(`audit needs --format as table, json or csv; it has "${values.format}"`);
  let bytes: Uint8Array;
  try {
    bytes = new Uint8Array(readFileSync(input));
  } catch (error) {
    return refused(`cannot read ${input}: ${systemWords(error)}`);
  }
  try {
    const cells = auditBook(engineHere(), bytes);
    const findings = cells.filter(hasFinding).length;
    const summary = `${input}: ${cells.length} WALL cells, ${findings} with findings`;
    return { status: findings > 0 ? 1 : 0, out: write(cells), complaints: values.quiet ? [] : [summary, ...CAUTIONS] };
  } catch (error) {
    if (error instanceof WorkbookError) return refused(`${input}: ${error.message}`);
    throw error;
  }
}

/** A line a cell in columns, and indented below it a line for each thing to say. */
function asTable(cells: readonly AuditedCell[]): string {
  const heads = cells.map((c) => [`${c.sheet}!${c.cell}`, c.functions.join(", "), c.state, c.why]);
  const widths = [0, 1, 2].map((i) => Math.max(0, ...heads.map((h) => h[i]!.length)));
  return cells
    .map((c, i) => {
      const line = heads[i]!.map((text, k) => (k < 3 ? text.padEnd(widths[k]!) : text)).join("  ").trimEnd();
      const more = [...c.inputs.map((t) => `input   ${t}`), ...c.beyond.map((t) => `range   ${t}`), ...c.notes.map((t) => `note    ${t}`)];
      return [line, ...more.map((text) => `    ${text}`)].map((text) => oneLine(text) + "\n").join("");
    })
    .join("");
}

function asCsv(cells: readonly AuditedCell[]): string {
  const rows = cells.map((c) => [c.sheet, c.cell, c.block, c.functions.join("; "), c.state, c.why, c.inputs.join("; "), c.beyond.join("; "), c.notes.join("; ")]);
  return [["sheet", "cell", "block", "functions", "state", "why", "inputs", "beyond range", "notes"], ...rows].map((row) => row.map((text) => csvCell(text)).join(",") + "\r\n").join("");
}

/** No line break and no control sign of a terminal comes out of a book. */
function oneLine(text: string): string {
  return text.replace(/[\u0000-\u001f\u007f-\u009f]+/g, " ");
}
