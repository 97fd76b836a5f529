import { strFromU8 } from "fflate";
import { catalogue } from "../cells/generated/catalogue";
import { cellFormulas } from "../workbook/cell-formulas";
import { cellBox, cellPlace } from "../workbook/cell-reference";
import { cellsInside } from "../workbook/cells-inside";
import { formulaReader } from "../workbook/plain-formula";
import { readWorkbook, type BookSheet, type Workbook } from "../workbook/read-workbook";
import type { StoredValue } from "../workbook/read-sheet";
import { shownSpelling } from "../workbook/stored-spelling";
import { typedContent } from "./block-writer";
import type { GridLibrary } from "./grid-library";
import { lostParts } from "./lost-parts";

/** A workbook file as the grid takes it. */
export interface ReadBook {
  /** The grid library's data form. */
  data: Record<string, unknown>;
  /** What will not be there when the book is saved again, in words. */
  lost: readonly string[];
}

/** A sheet in the library's data form, as far as we change it. */
interface DataSheet {
  name: string;
  cells: Record<string, string>;
  rowNumber: number;
  colNumber: number;
}

interface Data extends Record<string, unknown> {
  sheets: DataSheet[];
  formats: Record<string, string>;
}

/** Room below and beside the used part for spills. */
const SPARE_ROWS = 200;
const SPARE_COLUMNS = 26;
const FUNCTIONS = catalogue.map((f) => `WALL.${f.name}`);

/**
 * Reads an .xlsx book for the grid: styles, widths, merges and charts by the library's own reader, cells and formulas by ours, which
 * knows add-in calls, spills, shared formulas, names and tables. Throws a WorkbookError with a sentence where the file is none.
 */
export function readBook(library: GridLibrary, bytes: Uint8Array): ReadBook {
  const book = readWorkbook(bytes);
  const parts = Object.fromEntries([...book.package.parts].filter(([name]) => /\.(xml|rels)$/i.test(name)).map(([name, part]) => [name, strFromU8(part)]));
  const data = library.load(parts) as Data;
  const alias = (name: string): string => name.replace(/'/g, "’"); // the engine cannot read a sheet's name with an apostrophe
  const read = formulaReader(book, alias);
  for (const sheet of book.sheets) {
    const found = data.sheets.find((s) => s.name === sheet.name || s.name === alias(sheet.name));
    if (found === undefined) continue;
    found.name = alias(sheet.name);
    found.cells = sheetCells(sheet, (text, at) => shownSpelling(read(text, sheet.name, cellPlace(at)).text.replace(/^=/, ""), FUNCTIONS));
    let rows = 1;
    let columns = 1;
    for (const reference in found.cells) {
      const { row, column } = cellPlace(reference);
      rows = Math.max(rows, row);
      columns = Math.max(columns, column);
    }
    found.rowNumber = Math.max(found.rowNumber, rows + SPARE_ROWS);
    found.colNumber = Math.max(found.colNumber, columns + SPARE_COLUMNS);
  }
  for (const [id, format] of Object.entries(data.formats)) data.formats[id] = format.replace(/E\+00/g, "e");
  const lost = lostParts(book);
  if (book.sheets.some((s) => s.name.includes("'"))) lost.push("apostrophes in sheet names");
  return { data, lost: [...lost, ...unseen(book, data)] };
}

/** Contents of the cells as typed: formulas as shown, values kept from being read as something else; cells of a spill are left to it. */
function sheetCells(sheet: BookSheet, shown: (text: string, at: string) => string): Record<string, string> {
  const out: Record<string, string> = {};
  const formulas = cellFormulas(sheet.cells);
  const spilled = new Set<string>();
  for (const { reference, formula } of sheet.cells.values()) {
    if (formula?.kind !== "array" || formula.ref === undefined) continue;
    for (const inside of cellsInside(cellBox(formula.ref), sheet.cells)) if (inside !== reference) spilled.add(inside);
  }
  for (const { reference, value } of sheet.cells.values()) {
    const text = formulas.get(reference);
    if (text !== undefined) out[reference] = shown(text, reference);
    else if (!spilled.has(reference) && value !== null && value !== "") out[reference] = constant(value);
  }
  return out;
}

function constant(value: Exclude<StoredValue, null>): string {
  return typeof value === "object" ? "=" + value.error : typedContent(value);
}

/** Sheets the library's reader has passed over. */
function unseen(book: Workbook, data: Data): string[] {
  const there = new Set(data.sheets.map((s) => s.name));
  return book.sheets.filter((s) => !there.has(s.name.replace(/'/g, "’"))).map((s) => `the sheet ${s.name}`);
}
