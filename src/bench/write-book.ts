import { strFromU8, strToU8 } from "fflate";
import { catalogue } from "../cells/generated/catalogue";
import { sheetValue, storedErrorCode } from "../engine/engine-values";
import { SheetError } from "../engine/sheet-function";
import { boxName, cellName, cellPlace } from "../workbook/cell-reference";
import type { StoredValue } from "../workbook/read-sheet";
import { readWorkbook } from "../workbook/read-workbook";
import { patchSheet, type CellEdit } from "../workbook/patch-sheet";
import { storedSpelling } from "../workbook/stored-spelling";
import { writePackage } from "../workbook/write-package";
import { formulaXml } from "../workbook/xml-text";
import type { GridModel } from "./grid-library";

const FUNCTIONS = catalogue.map((f) => `WALL.${f.name}`);
/** One `<f>` of the library's export with the cell it belongs to. */
const FORMULA = /(<c r="([A-Z]+\d+)"[^>]*>\s*<f[^>]*>)([^<]*)(<\/f>)/g;

/**
 * The grid's book as an .xlsx file: sheets, styles and charts by the library's own writer, then formulas in the spelling in which Excel
 * stores add-in calls and younger functions, and every value that is shown, spills included, so that a reader without the add-in sees them.
 */
export async function writeBook(model: GridModel): Promise<Uint8Array> {
  const { files } = await model.exportXLSX();
  const parts = new Map<string, Uint8Array>();
  for (const file of files) if (file.content !== undefined) parts.set(file.path, strToU8(file.content));
  const styles = parts.get("xl/styles.xml");
  if (styles) parts.set("xl/styles.xml", strToU8(strFromU8(styles).replace(/formatCode="([^"]*)"/g, (_, code: string) => `formatCode="${code.replace(/(?<=[0#])e(?![^"]*")/g, "E+00")}"`)));
  const { getters } = model;
  getters.getSheetIds().forEach((sheetId, i) => {
    const part = `xl/worksheets/sheet${i}.xml`;
    const xml = parts.get(part);
    if (!xml) throw new Error(`The sheet ${getters.getSheetName(sheetId)} did not come out of the grid.`);
    parts.set(part, strToU8(strFromU8(xml).replace(FORMULA, (whole, open: string, reference: string, _text: string, close: string) => {
      const formula = formulaAt(model, sheetId, reference);
      return formula === undefined ? whole : open + formulaXml(storedSpelling(formula, FUNCTIONS)) + close;
    })));
  });
  const book = readWorkbook(writePackage({ parts, entries: new Map() }));
  getters.getSheetIds().forEach((sheetId, i) => {
    const sheet = book.sheets[i]!;
    parts.set(sheet.part, strToU8(patchSheet(sheet, shownValues(model, sheetId))));
  });
  return writePackage({ parts, entries: new Map() });
}

function formulaAt(model: GridModel, sheetId: string, reference: string): string | undefined {
  const { row, column } = cellPlace(reference);
  const cell = model.getters.getCell({ sheetId, col: column - 1, row: row - 1 });
  return cell?.isFormula ? (cell.compiledFormula?.toFormulaString(model.getters) ?? cell.content) : undefined;
}

/** What every formula shows, in its cell and in the block it spills. */
function shownValues(model: GridModel, sheetId: string): Map<string, CellEdit> {
  const { getters } = model;
  const edits = new Map<string, CellEdit>();
  for (const cell of getters.getCells(sheetId)) {
    if (!cell.isFormula) continue;
    const at = getters.getCellPosition(cell.id);
    const zone = getters.getSpreadZone(at);
    const box = zone && { left: zone.left + 1, right: zone.right + 1, top: zone.top + 1, bottom: zone.bottom + 1 };
    edits.set(cellName(at.col + 1, at.row + 1), { value: storedAt(model, at) ?? 0, ...(box && (box.right > box.left || box.bottom > box.top) ? { ref: boxName(box) } : {}) });
    if (!zone) continue;
    for (let row = zone.top; row <= zone.bottom; row++) {
      for (let col = zone.left; col <= zone.right; col++) if (col !== at.col || row !== at.row) edits.set(cellName(col + 1, row + 1), { value: storedAt(model, { sheetId, col, row }) });
    }
  }
  return edits;
}

function storedAt(model: GridModel, at: { sheetId: string; col: number; row: number }): StoredValue {
  const value = sheetValue(model.getters.getEvaluatedCell(at));
  return value instanceof SheetError ? { error: storedErrorCode(value.code) } : value;
}
