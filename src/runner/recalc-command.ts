import { readFileSync } from "node:fs";
import { parseArgs } from "node:util";
import { WorkbookError } from "../workbook/workbook-error";
import { refused, type CommandResult } from "./command-result";
import { engineHere } from "./engine-here";
import { isSameFile, systemWords } from "./file-words";
import { recalculate } from "./recalculate";
import { USAGE } from "./usage";
import { writeWhole } from "./write-whole";

/** `wallsheet recalc IN.xlsx -o OUT.xlsx` */
export function recalcCommand(args: readonly string[]): CommandResult {
  const { values, positionals } = parseArgs({
    args: [...args],
    allowPositionals: true,
    options: { output: { type: "string", short: "o" }, "in-place": { type: "boolean" }, quiet: { type: "boolean", short: "q" }, help: { type: "boolean", short: "h" } },
  });
  if (values.help) return { status: 0, out: USAGE.recalc + "\n", complaints: [] };
  const [input, ...more] = positionals;
  if (input === undefined || more.length > 0) return refused("recalc needs one workbook; see wallsheet recalc --help");
  const output = values["in-place"] ? input : values.output;
  if (output === undefined) return refused("recalc needs -o OUT.xlsx or --in-place");
  if (values["in-place"] && values.output !== undefined) return refused("recalc takes -o or --in-place, not both");
  if (!values["in-place"] && isSameFile(input, output)) return refused("recalc would write over its input; say --in-place if that is meant");
  let bytes: Uint8Array;
  try {
    bytes = new Uint8Array(readFileSync(input));
  } catch (error) {
    return refused(`cannot read ${input}: ${systemWords(error)}`);
  }
  try {
    const done = recalculate(engineHere(), bytes);
    try {
      writeWhole(output, done.bytes);
    } catch (error) {
      return refused(`cannot write ${output}: ${systemWords(error)}`);
    }
    const { formulas, wall, changed } = done.counts;
    const summary = `${input}: ${formulas} formulas calculated, ${wall} with WALL functions; ${changed} cells changed`;
    const lines = done.notes.map((n) => `${n.sheet}!${n.cell}: ${n.text}`);
    return { status: done.notes.some((n) => n.kind !== "kept") ? 1 : 0, out: "", complaints: values.quiet ? [] : [...lines, summary] };
  } catch (error) {
    if (error instanceof WorkbookError) return refused(`${input}: ${error.message}`);
    throw error;
  }
}
