import { SheetError, type SheetValue } from "./sheet-function";
import { sheetRows, sheetValue } from "./engine-values";
import type { Engine } from "./types";

/** A book of one empty sheet is kept per engine: a formula without references never needs more. */
const EMPTY_BOOK = { sheets: [{ id: "sheet", name: "Sheet1", rowNumber: 100, colNumber: 26, cells: {} }] };

/**
 * One formula in an empty book. Gives a scalar, or rows × columns where the formula spills; an error is a `SheetError` with
 * Excel's code and the sentence. The leading `=` may be left out.
 */
export function evaluateFormula(engine: Engine, formula: string): SheetValue | SheetValue[][] {
  const text = formula.trimStart().startsWith("=") ? formula.trimStart() : `=${formula}`;
  const model = new engine.library.Model(structuredClone(EMPTY_BOOK));
  const result = model.getters.evaluateFormulaResult("sheet", text);
  if (!Array.isArray(result)) return sheetValue(result);
  const rows = sheetRows(result);
  if (rows.length === 0) return new SheetError("#VALUE!", "The formula gives an empty table.");
  return rows.length === 1 && rows[0]!.length === 1 ? rows[0]![0]! : rows;
}
