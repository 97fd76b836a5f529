import { cellBox, cellPlace, type CellBox } from "./cell-reference";
import { cellFormulas } from "./cell-formulas";
import { formulaReader } from "./plain-formula";
import type { StoredCell } from "./read-sheet";
import type { BookSheet, Workbook } from "./read-workbook";
import { isWallCall, wallFunctionName } from "./wall-call";

/** A cell whose formula calls one of our functions, itself or through a defined name. */
export interface WallCell {
  sheet: BookSheet;
  cell: StoredCell;
  /** The formula as a file stores it, without "="; that of a shared formula moved to this cell. */
  formula: string;
  /** The block it fills, as the file tells: one cell unless it is an array formula. */
  box: CellBox;
  /** Our functions it calls, each once, without the namespace, in the order of the calls. */
  functions: string[];
}

/** Every cell of the book that calls one of our functions, sheet by sheet, row by row. */
export function wallCells(book: Pick<Workbook, "sheets" | "names" | "tables">): WallCell[] {
  const read = formulaReader(book);
  const called = callsOf(book, read);
  return book.sheets.flatMap((sheet) => {
    const found: WallCell[] = [];
    for (const [reference, formula] of cellFormulas(sheet.cells)) {
      const cell = sheet.cells.get(reference)!;
      const functions = called(formula, sheet.name, reference);
      if (functions.length === 0) continue;
      found.push({ sheet, cell, formula, box: cellBox(cell.formula?.kind === "array" ? (cell.formula.ref ?? reference) : reference), functions });
    }
    return found.map((f) => ({ f, at: cellPlace(f.cell.reference) })).sort((a, b) => a.at.row - b.at.row || a.at.column - b.at.column).map(({ f }) => f);
  });
}

/** Our functions that a formula calls; a name that is called like a function (a LAMBDA) is followed into what it stands for. */
function callsOf(book: Pick<Workbook, "names">, read: ReturnType<typeof formulaReader>): (formula: string, sheet: string, at: string) => string[] {
  const names = new Map(book.names.map((n) => [n.name.toUpperCase(), n]));
  const find = (formula: string, sheet: string, at: string, seen: ReadonlySet<string>): string[] =>
    read(formula, sheet, cellPlace(at)).functions.flatMap((name) => {
      const lambda = seen.has(name) ? undefined : names.get(name);
      if (lambda) return find(lambda.text.replace(/^=/, ""), sheet, at, new Set([...seen, name]));
      return isWallCall(name) ? [wallFunctionName(name)] : [];
    });
  return (formula, sheet, at) => [...new Set(find(formula, sheet, at, new Set()))];
}
