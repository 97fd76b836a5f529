/**
 * Seam: formula text in and out. Pinned: @odoo/o-spreadsheet 19.3.7, exported `CompiledFormula` (static `Compile` and
 * `IsBadExpression`, method `toFormulaString`), `stores.CellComposerStore.prototype.getPrettifiedFormula`.
 *
 * Relies on: every formula, typed, pasted, loaded or made by a menu, passing `CompiledFormula.Compile`; every place that shows
 * or saves a formula asking `toFormulaString`, except the line being edited, which asks `getPrettifiedFormula`. The engine's own
 * pretty-printer drops brackets by its own precedence (`=-(A1^2)` and `=(-A1)^2` come out alike) and so changes a formula's
 * value when it is edited; here the text stays as it was typed, spaces and brackets included.
 * How it would break: the self-test reads the text of `=-(A1^2)` back.
 */
import { excelText } from "./excel-text";
import type { EngineLibrary } from "./types";

/** Wraps compilation with `normalise` and gives formulas back in Excel's spelling. */
export function installText(library: EngineLibrary, normalise: (formula: string) => string): void {
  const { CompiledFormula } = library;
  const { Compile: compile, IsBadExpression: isBadExpression } = CompiledFormula;
  CompiledFormula.Compile = (formula, sheetId, getters) => compile.call(CompiledFormula, normalise(formula), sheetId, getters);
  CompiledFormula.IsBadExpression = (formula) => isBadExpression.call(CompiledFormula, normalise(formula));

  CompiledFormula.prototype.toFormulaString = function (getters, ...options) {
    const text = this.isBadExpression ? this.normalizedFormula : this.getTokens(getters, ...options).map((token) => token.value).join("");
    return excelText(text);
  };
  library.stores.CellComposerStore.prototype.getPrettifiedFormula = function (cell) {
    return cell.compiledFormula!.toFormulaString(this.getters);
  };
}
