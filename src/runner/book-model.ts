import { FIXED_BLOCK } from "../engine/excel-functions/fixed-block";
import type { Engine, EngineModel } from "../engine/types";
import { cellFormulas } from "../workbook/cell-formulas";
import { cellBox, cellPlace, columnLetters } from "../workbook/cell-reference";
import { cellsInside } from "../workbook/cells-inside";
import { formulaReader } from "../workbook/plain-formula";
import type { StoredCell, StoredValue } from "../workbook/read-sheet";
import { WorkbookError } from "../workbook/workbook-error";
import type { BookSheet, Workbook } from "../workbook/read-workbook";
import { callsWall, leftJudge, type Left } from "./why-left";

/** A formula cell as it goes into the engine. */
export interface ModelFormula {
  cell: StoredCell;
  /** Plain text of the formula, with its "=". */
  text: string;
  /** Why it is not calculated here; its stored value stands in for it. */
  left?: Left;
  callsWall: boolean;
}

export interface ModelSheet {
  sheet: BookSheet;
  /** The engine's id of the sheet. */
  id: string;
  formulas: Map<string, ModelFormula>;
  /** Cells that held the spilled part of an array formula, with that formula's cell. */
  spilled: Map<string, string>;
}

export interface BookModel {
  model: EngineModel;
  sheets: ModelSheet[];
}

/** Room below and beside the used part for spills, besides their inputs' length. */
const SPARE_ROWS = 1_000;
const SPARE_COLUMNS = 60;
/** The engine takes some 40 µs a row and 1 ms a column of a sheet, used or not (measured): what lies beyond would take minutes. */
const MOST_ROWS = 400_000;
const MOST_COLUMNS = 4_000;
/** The engine's format code for cells whose content is text whatever it looks like. */
const TEXT_FORMAT = 1;

const HIDDEN_ROW = /<(?:[\w.-]+:)?row\s(?:"[^"]*"|'[^']*'|[^<>"'])*?(?<=\s)hidden\s*=\s*["'](?:1|true)["']/;

/** Puts a workbook's constants and formulas into the sheet engine. */
export function bookModel(engine: Engine, book: Workbook): BookModel {
  const alias = sheetAliases(book.sheets.map((s) => s.name));
  const read = formulaReader(book, alias);
  const whyLeft = leftJudge(engine, { from1904: book.from1904, hidesRows: book.sheets.some((s) => HIDDEN_ROW.test(s.xml)) });

  const sheets = book.sheets.map((sheet): ModelSheet => {
    const formulas = new Map<string, ModelFormula>();
    const spilled = new Map<string, string>();
    const texts = cellFormulas(sheet.cells);
    for (const cell of sheet.cells.values()) {
      if (!cell.formula) continue;
      const text = cell.formula.kind === "dataTable" ? "" : texts.get(cell.reference);
      if (text === undefined) continue;
      const plain = read(text, sheet.name, cellPlace(cell.reference));
      const left = whyLeft(cell, plain);
      formulas.set(cell.reference, { cell, text: left ? plain.text : blockText(cell, plain.text), callsWall: callsWall(plain), ...(left === undefined ? {} : { left }) });
    }
    for (const { cell } of formulas.values()) {
      if (cell.formula?.kind !== "array" || cell.formula.ref === undefined) continue;
      for (const reference of cellsInside(cellBox(cell.formula.ref), sheet.cells)) if (reference !== cell.reference && !formulas.has(reference)) spilled.set(reference, cell.reference);
    }
    return { sheet, id: alias(sheet.name), formulas, spilled };
  });
  return { model: modelOf(engine, sheets, new Set()), sheets };
}

/** A cell that holds part of the result of an array formula which is calculated anew, and so no value of its own. */
export function isSpilled({ formulas, spilled }: Pick<ModelSheet, "formulas" | "spilled">, reference: string): boolean {
  const source = spilled.get(reference);
  return source !== undefined && formulas.get(source)?.left === undefined;
}

/** The engine's model; formulas named in `single` give their first value only, as an old workbook's plain cells do. */
export function modelOf(engine: Engine, sheets: readonly ModelSheet[], single: ReadonlySet<string>): EngineModel {
  return new engine.library.Model({
    version: "19.3",
    revisionId: "START_REVISION",
    formats: { [TEXT_FORMAT]: "@" },
    sheets: sheets.map(({ sheet, id, formulas, spilled }) => {
      const cells: Record<string, string> = {};
      const formats: Record<string, number> = {};
      for (const cell of sheet.cells.values()) {
        const { reference } = cell;
        if (isSpilled({ formulas, spilled }, reference)) continue;
        const formula = formulas.get(reference);
        if (formula && formula.left === undefined) cells[reference] = single.has(`${id}!${reference}`) ? `=SINGLE(${formula.text.slice(1)})` : formula.text;
        else {
          const content = constantText(cell.value);
          if (content === undefined) continue;
          cells[reference] = content;
          if (typeof cell.value === "string" && content === cell.value) formats[reference] = TEXT_FORMAT;
        }
      }
      return { id, name: id, ...gridSize(sheet.name, cells, sheet.cells), cells, formats };
    }),
  });
}

/** The grid holds the used cells and, below the lowest array formula, as many rows again: a spill is as long as its inputs. */
function gridSize(sheet: string, used: Record<string, string>, stored: ReadonlyMap<string, StoredCell>): { rowNumber: number; colNumber: number } {
  let rows = 1;
  let columns = 1;
  let lowestArray = 0;
  for (const reference in used) {
    const { row, column } = cellPlace(reference);
    rows = Math.max(rows, row);
    columns = Math.max(columns, column);
    if (stored.get(reference)?.formula?.kind === "array") lowestArray = Math.max(lowestArray, row);
  }
  if (rows > MOST_ROWS || columns > MOST_COLUMNS) {
    throw new WorkbookError(`The sheet ${sheet} is used as far as row ${rows} and column ${columnLetters(columns)}; sheets of more than ${MOST_ROWS} rows or ${MOST_COLUMNS} columns are not calculated here.`);
  }
  return { rowNumber: lowestArray + rows + SPARE_ROWS, colNumber: columns + SPARE_COLUMNS };
}

/** An array formula of the old kind is told its block. */
function blockText(cell: StoredCell, text: string): string {
  if (cell.formula?.kind !== "array" || cell.attributes["cm"] !== undefined) return text;
  const { left, right, top, bottom } = cellBox(cell.formula.ref ?? cell.reference);
  return `=${FIXED_BLOCK}(${text.replace(/^\s*=/, "")},${bottom - top + 1},${right - left + 1})`;
}

function constantText(value: StoredValue): string | undefined {
  if (value === null || value === "") return undefined;
  if (typeof value === "object") return "=" + value.error;
  if (typeof value === "boolean") return value ? "TRUE" : "FALSE";
  // The engine takes text that begins like a formula for one, whatever its format.
  if (typeof value === "string" && value.startsWith("=")) return `="${value.replace(/"/g, '""')}"`;
  return String(value);
}

/** The engine cannot read a sheet's name with an apostrophe in it; such a sheet gets a name of its own inside the engine. */
function sheetAliases(names: readonly string[]): (name: string) => string {
  const taken = new Set(names.map((n) => n.toLowerCase()));
  const aliases = new Map<string, string>();
  for (const name of names) {
    if (!name.includes("'")) continue;
    let alias = name.replace(/'/g, "’");
    while (taken.has(alias.toLowerCase())) alias += "’";
    taken.add(alias.toLowerCase());
    aliases.set(name.toLowerCase(), alias);
  }
  return (name) => aliases.get(name.toLowerCase()) ?? name;
}
