import { loadHeadless } from "../../src/engine/load-headless";
import { prepareEngine } from "../../src/engine/prepare-engine";
import type { SheetFunction } from "../../src/engine/sheet-function";
import type { Engine, EngineModel } from "../../src/engine/types";

/** A prepared engine on the installed library, with the functions a test brings. */
export function preparedEngine(functions: readonly SheetFunction[] = []): Engine {
  return prepareEngine(loadHeadless(process.cwd()), functions);
}

/** A book of one sheet, `Sheet1` with id `s`. */
export function book(engine: Engine, cells: Record<string, string>): EngineModel {
  return new engine.library.Model({ sheets: [{ id: "s", name: "Sheet1", rowNumber: 60, colNumber: 26, cells }] });
}

/** Value of a cell in A1 spelling; an error is its engine code. */
export function valueAt(model: EngineModel, xc: string, sheetId = "s"): number | string | boolean | null {
  const [, letters, digits] = /^([A-Z])(\d+)$/.exec(xc)!;
  return model.getters.getEvaluatedCell({ sheetId, col: letters!.charCodeAt(0) - 65, row: Number(digits) - 1 }).value;
}

/** The formula a cell shows. */
export function textAt(model: EngineModel, xc: string): string | undefined {
  const [, letters, digits] = /^([A-Z])(\d+)$/.exec(xc)!;
  return model.getters.getCell({ sheetId: "s", col: letters!.charCodeAt(0) - 65, row: Number(digits) - 1 })?.compiledFormula?.toFormulaString(model.getters);
}
