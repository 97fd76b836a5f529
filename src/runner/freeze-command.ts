import { existsSync, readFileSync } from "node:fs";
import path from "node:path";
import { parseArgs } from "node:util";
import project from "../../package.json";
import { CAUTIONS } from "../cells/cautions";
import { catalogue } from "../cells/generated/catalogue";
import { tableRemarks } from "../cells/reading/table-remarks";
import { placeKey } from "../workbook/place-key";
import { plainCopy } from "../workbook/plain-copy";
import { readWorkbook } from "../workbook/read-workbook";
import { WorkbookError } from "../workbook/workbook-error";
import { refused, type CommandResult } from "./command-result";
import { engineHere } from "./engine-here";
import { isSameFile, systemWords } from "./file-words";
import { recalculate, type RecalcNote } from "./recalculate";
import { USAGE } from "./usage";
import { writeWhole } from "./write-whole";

/** `wallsheet freeze BOOK [-o OUT] [--date YYYY-MM-DD]`; today's date is looked up here and nowhere deeper. */
export function freezeCommand(args: readonly string[], today: string = localDay(new Date())): CommandResult {
  const { values, positionals } = parseArgs({
    args: [...args],
    allowPositionals: true,
    options: { output: { type: "string", short: "o" }, date: { type: "string" }, "as-stored": { type: "boolean" }, quiet: { type: "boolean", short: "q" }, help: { type: "boolean", short: "h" } },
  });
  if (values.help) return { status: 0, out: USAGE.freeze + "\n", complaints: [] };
  const [input, ...more] = positionals;
  if (input === undefined || more.length > 0) return refused("freeze needs one workbook; see wallsheet freeze --help");
  const date = values.date ?? today;
  if (!isDay(date)) return refused(`freeze needs --date as YYYY-MM-DD, a day of the calendar; it has "${date}"`);
  const { dir, name, ext } = path.parse(input);
  const output = values.output ?? path.join(dir, `${name}-plain${ext}`);
  if (isSameFile(input, output)) return refused("freeze would write over its input, whose formulas would be lost; name another file with -o");
  if (values.output === undefined && existsSync(output)) return refused(`${output} exists already; name it with -o to write over it`);
  let bytes: Uint8Array;
  try {
    bytes = new Uint8Array(readFileSync(input));
  } catch (error) {
    return refused(`cannot read ${input}: ${systemWords(error)}`);
  }
  try {
    const done = frozenBook(bytes, date, values["as-stored"] ?? false);
    try {
      writeWhole(output, done.bytes);
    } catch (error) {
      return refused(`cannot write ${output}: ${systemWords(error)}`);
    }
    const lines = [...done.notes.map((n) => `${n.sheet}!${n.cell}: ${n.text}`), ...done.remaining.map((what) => `${what} still calls functions of Wallsheet`)];
    const summary = done.cells === 0 ? `${input}: no cell calls a WALL function; ${output} is a plain copy byte for byte` : `${output}: ${done.cells} WALL cells frozen; notes in the sheet "${done.notesSheet}"`;
    return { status: done.notes.some((n) => n.kind !== "kept") ? 1 : 0, out: "", complaints: values.quiet ? [] : [...lines, summary] };
  } catch (error) {
    if (error instanceof WorkbookError) return refused(`${input}: ${error.message}`);
    throw error;
  }
}

function frozenBook(bytes: Uint8Array, date: string, asStored: boolean): { bytes: Uint8Array; notes: readonly RecalcNote[]; remaining: readonly string[]; cells: number; notesSheet: string } {
  const { bytes: current, notes } = asStored ? { bytes, notes: [] } : recalculate(engineHere(), bytes);
  const said = new Map(notes.map((n) => [placeKey(n.sheet, n.cell), n.text]));
  const copy = plainCopy(readWorkbook(current), {
    methods: catalogue,
    version: project.version,
    date,
    cautions: CAUTIONS,
    remarks: ({ sheet, cell }, values) => {
      const { beyond, notes: noted } = tableRemarks(values);
      const known = said.get(placeKey(sheet.name, cell.reference));
      const own = known ?? (cell.value !== null && typeof cell.value === "object" ? `shows ${cell.value.error}` : cell.value === null ? "held no value when it was frozen" : undefined);
      return { warnings: [...(asStored ? ["the value as the file held it, not calculated anew for this copy"] : []), ...(own === undefined ? [] : [own]), ...beyond], notes: noted };
    },
  });
  if (copy.cells.length === 0) return { bytes, notes: [], remaining: copy.remaining, cells: 0, notesSheet: "" };
  return { bytes: copy.bytes, notes, remaining: copy.remaining, cells: copy.cells.length, notesSheet: copy.notesSheet };
}

function isDay(text: string): boolean {
  return /^\d{4}-\d{2}-\d{2}$/.test(text) && !Number.isNaN(Date.parse(text)) && new Date(text).toISOString().startsWith(text);
}

/** The day where the user is. */
function localDay(now: Date): string {
  return [now.getFullYear(), now.getMonth() + 1, now.getDate()].map((n) => String(n).padStart(2, "0")).join("-");
}
