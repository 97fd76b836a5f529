/** The start-up check that every seam of the pinned library behaves; a failure names the seam and stops the start. */
import { registerFunctions } from "./register-functions";
import type { EngineLibrary } from "./types";

export const PINNED_VERSION = "19.3.7";

const PROBE = "WALLSHEET.SELF.TEST";
const SHEET = "sheet";
/** Each check stands in a column of its own; the largest spill has 3 rows. */
const ROWS = 10;

interface Check {
  seam: string;
  formula: string;
  /** Values expected from the formula's cell downwards; the formula's own text is expected back as well. */
  values: readonly (number | string | boolean)[];
}

const CHECKS: readonly Check[] = [
  { seam: "formula compiler (precedence)", formula: "=-2^2", values: [4] },
  { seam: "formula compiler (cells)", formula: "=-$A$1^2", values: [4] },
  { seam: "formula text", formula: "=-($A$1^2)", values: [-4] },
  { seam: "formula normaliser", formula: '=LOG10(100) & "a""b"', values: ['2a"b'] },
  { seam: "LET", formula: "=LET(a,3,b,a*$A$1,b+a)", values: [9] },
  { seam: "LAMBDA", formula: "=LET(f,LAMBDA(x,x^2),f(3))", values: [9] },
  { seam: "spill", formula: "=MAP(SEQUENCE(3),LAMBDA(x,x*10))", values: [10, 20, 30] },
  { seam: "functions missing from the engine", formula: "=SIGN(-$A$1)", values: [-1] },
  { seam: "function arguments", formula: `=${PROBE}($A$1:$A$2,$A$1)`, values: ["[[2],[null]] Sheet1!A1:A2", "[[2]] Sheet1!A1", "omitted"] },
  { seam: "function errors", formula: `=IFERROR(${PROBE}("fail"),"caught")`, values: ["caught"] },
];

/** Runs every check; throws an error that lists what does not behave. */
export function selfTest(library: EngineLibrary): void {
  const faults: string[] = [];
  try {
    registerProbe(library);
    const cells: Record<string, string> = { A1: "2" };
    CHECKS.forEach((check, i) => (cells[`${String.fromCharCode(66 + i)}1`] = check.formula));
    const { getters } = new library.Model({ sheets: [{ id: SHEET, name: "Sheet1", rowNumber: ROWS, colNumber: CHECKS.length + 2, cells }] });
    CHECKS.forEach(({ seam, formula, values }, i) => {
      const at = (row: number) => ({ sheetId: SHEET, col: i + 1, row });
      values.forEach((expected, row) => {
        const { value, message } = getters.getEvaluatedCell(at(row));
        if (value !== expected) faults.push(`${seam}: ${formula} gives ${String(value)}${message ? ` (${message})` : ""} in row ${row + 1}, not ${String(expected)}`);
      });
      const text = getters.getCell(at(0))?.compiledFormula?.toFormulaString(getters);
      if (text !== formula) faults.push(`${seam}: the text ${formula} comes back as ${text}`);
    });
    if (!library.registries.functionRegistry.get("NO.SUCH.FUNCTION").hidden) faults.push("tolerant registry: an unknown name is not hidden");
  } catch (error) {
    faults.push(`stopped by: ${error instanceof Error ? error.message : String((error as { message?: unknown }).message ?? error)}`);
  }
  if (library.__info__.version !== PINNED_VERSION && faults.length > 0) faults.unshift(`version ${library.__info__.version} is loaded, ${PINNED_VERSION} is needed`);
  if (faults.length > 0) throw new Error(`The sheet engine does not behave as Wallsheet needs it to:\n  ${faults.join("\n  ")}`);
}

function registerProbe(library: EngineLibrary): void {
  registerFunctions(library, [
    {
      name: PROBE,
      description: "",
      category: "",
      parameters: ["first", "second", "third"].map((name) => ({ name, description: "", optional: name !== "first" })),
      call(args, addresses) {
        if ((args[0] as unknown[][])[0]![0] === "fail") throw { code: "#VALUE!", message: "as asked" };
        return args.map((arg, i) => [arg === undefined ? "omitted" : `${JSON.stringify(arg)} ${addresses[i]}`]);
      },
    },
  ]);
  library.registries.functionRegistry.content[PROBE]!.hidden = true;
}
