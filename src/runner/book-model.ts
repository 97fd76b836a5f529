import type { Engine, EngineModel } from "../engine/types";
import { cellBox, cellPlace } from "../workbook/cell-reference";
import { cellsOf } from "../workbook/patch-sheet";
import { formulaReader, sharedFormulaAt } from "../workbook/plain-formula";
import type { StoredCell, StoredValue } from "../workbook/read-sheet";
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

/** Room below and beside the used part for spills; a spill is as long as its inputs, which lie in the used part. */
const SPARE_ROWS = 1_000;
const SPARE_COLUMNS = 60;
/** The engine's format code for cells whose content is text whatever it looks like. */
const TEXT_FORMAT = 1;

/** Puts a workbook's constants and formulas into the sheet engine. */
export function bookModel(engine: Engine, book: Workbook): BookModel {
  const alias = sheetAliases(book.sheets.map((s) => s.name));
  const read = formulaReader(book, alias);
  const whyLeft = leftJudge(engine, book.from1904);

  const sheets = book.sheets.map((sheet): ModelSheet => {
    const formulas = new Map<string, ModelFormula>();
    const spilled = new Map<string, string>();
    const shared = new Map<string, StoredCell>();
    for (const cell of sheet.cells.values()) if (cell.formula?.kind === "shared" && cell.formula.text !== "") shared.set(cell.formula.shared ?? "", cell);
    for (const cell of sheet.cells.values()) {
      if (!cell.formula) continue;
      const text = formulaText(cell, shared);
      if (text === undefined) continue;
      const plain = read(text, sheet.name, cellPlace(cell.reference));
      const left = whyLeft(cell, plain);
      formulas.set(cell.reference, { cell, text: plain.text, callsWall: callsWall(plain), ...(left === undefined ? {} : { left }) });
    }
    for (const { cell, left } of formulas.values()) {
      if (cell.formula?.kind !== "array" || cell.formula.ref === undefined || left !== undefined) continue;
      for (const reference of cellsOf(cellBox(cell.formula.ref))) if (reference !== cell.reference && !formulas.has(reference)) spilled.set(reference, cell.reference);
    }
    return { sheet, id: alias(sheet.name), formulas, spilled };
  });
  return { model: modelOf(engine, sheets, new Set()), sheets };
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
      let rows = 1;
      let columns = 1;
      for (const cell of sheet.cells.values()) {
        const { reference } = cell;
        const place = cellPlace(reference);
        rows = Math.max(rows, place.row);
        columns = Math.max(columns, place.column);
        if (spilled.has(reference)) continue;
        const formula = formulas.get(reference);
        if (formula && formula.left === undefined) cells[reference] = single.has(`${id}!${reference}`) ? `=SINGLE(${formula.text.slice(1)})` : formula.text;
        else {
          const content = constantText(cell.value);
          if (content === undefined) continue;
          cells[reference] = content;
          if (typeof cell.value === "string" && content === cell.value) formats[reference] = TEXT_FORMAT;
        }
      }
      return { id, name: id, rowNumber: 2 * rows + SPARE_ROWS, colNumber: columns + SPARE_COLUMNS, cells, formats };
    }),
  });
}

function formulaText(cell: StoredCell, shared: ReadonlyMap<string, StoredCell>): string | undefined {
  const { formula } = cell;
  if (!formula) return undefined;
  if (formula.kind !== "shared" || formula.text !== "") return formula.text === "" ? undefined : formula.text;
  const master = shared.get(formula.shared ?? "");
  return master?.formula && sharedFormulaAt(master.formula.text, master.reference, cell.reference);
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
