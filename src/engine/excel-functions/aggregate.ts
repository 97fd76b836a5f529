/** AGGREGATE, which the engine (19.3.7) lacks, and whose formulajs version is wrong. */
import { engineErrorCode, isEngineError } from "../engine-values";
import type { EngineArgument, EngineContext, EngineLibrary, EngineValue } from "../types";
import { ExcelError, numberOf, rowFirst } from "./define";
import { fail } from "./elementary";

/** By Excel's numbers, from 1; those from 14 on take a further argument. */
const FUNCTIONS = "AVERAGE COUNT COUNTA MAX MIN PRODUCT STDEV.S STDEV.P SUM VAR.S VAR.P MEDIAN MODE.SNGL LARGE SMALL PERCENTILE.INC QUARTILE.INC PERCENTILE.EXC QUARTILE.EXC".split(" ");
const FIRST_WITH_K = 14;
const NESTED = /(?<![\w.])(?:SUBTOTAL|AGGREGATE)\(/i;

/** Options 2, 3, 6 and 7 skip errors; 0 to 3 skip cells that hold a SUBTOTAL or AGGREGATE. Hidden rows are not known here: why-left.ts keeps such books from it. */
export function installAggregate(library: EngineLibrary): void {
  const registry = library.registries.functionRegistry;
  registry.replace("AGGREGATE", {
    description: "A sum, mean or other figure of a range without its errors or subtotals.",
    category: "Excel",
    isExported: true,
    args: ["function (number)", "option (number)", "array (any, range)", "more (any, range, optional, repeating)"].map((definition) => library.helpers.arg(definition, "")),
    compute(code, option, ...arrays) {
      try {
        const place = Math.trunc(numberOf(code));
        const skip = Math.trunc(numberOf(option));
        const name = FUNCTIONS[place - 1] ?? fail("AGGREGATE needs a function from 1 to 19.", "#VALUE!");
        if (!(skip >= 0 && skip <= 7)) fail("AGGREGATE needs an option from 0 to 7.", "#VALUE!");
        const k = place >= FIRST_WITH_K ? (arrays.splice(1)[0] ?? fail(`AGGREGATE needs a further argument for ${name}.`, "#VALUE!")) : undefined;
        const values = arrays.flatMap((array) => cells(array)).filter((cell) => !(skip % 4 >= 2 && isEngineError(cell)) && !(skip < 4 && isSubtotal(this, cell)));
        const error = values.find(isEngineError);
        if (error && name !== "COUNT" && name !== "COUNTA") return error;
        if (values.length === 0) values.push({ value: null });
        return registry.content[name]!.compute.apply(this, k === undefined ? [[values]] : [[values], k]);
      } catch (error) {
        if (error instanceof ExcelError) return new library.EvaluationError(error.message, engineErrorCode(error.code));
        throw error;
      }
    },
  });
}

function cells(argument: EngineArgument): EngineValue[] {
  return argument === undefined ? [] : Array.isArray(argument) ? rowFirst(argument) : [argument];
}

function isSubtotal(context: EngineContext, { position }: EngineValue): boolean {
  const formula = position && context.getters.getCell(position)?.compiledFormula;
  return formula !== undefined && NESTED.test(formula.toFormulaString(context.getters));
}
