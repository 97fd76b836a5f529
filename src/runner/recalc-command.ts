import { readFileSync } from "node:fs";
import { parseArgs } from "node:util";
import { WorkbookError } from "../workbook/workbook-error";
import { checkReport } from "./check-report";
import { refused, type CommandResult } from "./command-result";
import { engineHere } from "./engine-here";
import { isSameFile, systemWords } from "./file-words";
import { recalculate } from "./recalculate";
import { USAGE } from "./usage";
import { writeWhole } from "./write-whole";

/** Numbers nearer than this are one value in a check: far above what another program's last digits make of a long march, far below what an engineer reads. */
const TOLERANCE = 1e-9;

/** `wallsheet recalc IN.xlsx -o OUT.xlsx`, `wallsheet recalc --check IN.xlsx` */
export function recalcCommand(args: readonly string[]): CommandResult {
  const { values, positionals } = parseArgs({
    args: [...args],
    allowPositionals: true,
    options: {
      output: { type: "string", short: "o" },
      "in-place": { type: "boolean" },
      check: { type: "boolean" },
      tolerance: { type: "string" },
      floor: { type: "string" },
      quiet: { type: "boolean", short: "q" },
      help: { type: "boolean", short: "h" },
    },
  });
  if (values.help) return { status: 0, out: USAGE.recalc + "\n", complaints: [] };
  const [input, ...more] = positionals;
  if (input === undefined || more.length > 0) return refused("recalc needs one workbook; see wallsheet recalc --help");
  const output = values["in-place"] ? input : values.output;
  if (values["in-place"] && values.output !== undefined) return refused("recalc takes -o or --in-place, not both");
  if (values.check && output !== undefined) return refused("recalc --check writes no book; leave out -o and --in-place");
  if (!values.check && (values.tolerance ?? values.floor) !== undefined) return refused("--tolerance and --floor belong to --check");
  const [tolerance, floor] = [amount(values.tolerance, TOLERANCE), amount(values.floor, 0)];
  if (tolerance === undefined || floor === undefined) return refused(`--${tolerance === undefined ? "tolerance" : "floor"} needs a number of at least 0`);
  if (output === undefined && !values.check) return refused("recalc needs -o OUT.xlsx, --in-place or --check");
  if (output !== undefined && !values["in-place"] && isSameFile(input, output)) return refused("recalc would write over its input; say --in-place if that is meant");
  let bytes: Uint8Array;
  try {
    bytes = new Uint8Array(readFileSync(input));
  } catch (error) {
    return refused(`cannot read ${input}: ${systemWords(error)}`);
  }
  try {
    const done = recalculate(engineHere(), bytes);
    const lines = done.notes.map((n) => `${n.sheet}!${n.cell}: ${n.text}`);
    if (output === undefined) {
      const { differing, summary } = checkReport(done, { tolerance, floor });
      return { status: differing.length > 0 ? 1 : 0, out: differing.map((line) => line + "\n").join(""), complaints: values.quiet ? [] : [...lines, `${input}: ${summary}`] };
    }
    try {
      writeWhole(output, done.bytes);
    } catch (error) {
      return refused(`cannot write ${output}: ${systemWords(error)}`);
    }
    const { formulas, wall, changed } = done.counts;
    const summary = `${input}: ${formulas} formulas calculated, ${wall} with WALL functions; ${changed} cells changed`;
    return { status: done.notes.some((n) => n.kind !== "kept") ? 1 : 0, out: "", complaints: values.quiet ? [] : [...lines, summary] };
  } catch (error) {
    if (error instanceof WorkbookError) return refused(`${input}: ${error.message}`);
    throw error;
  }
}

/** The number of an option, or what holds without it; undefined where it is none. */
function amount(text: string | undefined, missing: number): number | undefined {
  if (text === undefined) return missing;
  const value = text.trim() === "" ? NaN : Number(text);
  return Number.isFinite(value) && value >= 0 ? value : undefined;
}

