import { UNKNOWN_FORMAT } from "../engine/excel-functions/corrections";
import { sheetValue, storedErrorCode } from "../engine/engine-values";
import { SheetError } from "../engine/sheet-function";
import type { Engine, EngineModel } from "../engine/types";
import { boxName, cellBox, cellPlace, type CellBox } from "../workbook/cell-reference";
import { cellsOf, patchSheet, type CellEdit } from "../workbook/patch-sheet";
import type { StoredValue } from "../workbook/read-sheet";
import { asksRecalculation, withRecalculation } from "../workbook/recalculation-flag";
import { readWorkbook, type Workbook } from "../workbook/read-workbook";
import { writePackage } from "../workbook/write-package";
import { bookModel, isSpilled, modelOf, type ModelFormula, type ModelSheet } from "./book-model";
import { staleCells } from "./stale-cells";

/** One thing a recalculation has to say about a cell. */
export interface RecalcNote {
  sheet: string;
  cell: string;
  /**
   * "error": the cell shows an error; "left": it could not be calculated here, and what it reads has changed, or nobody vouched for
   * its value; "kept": nothing it reads has changed, or its value changes by itself. The stored value stays in the last two.
   */
  kind: "error" | "left" | "kept";
  text: string;
}

/** A cell whose stored value is not the calculated one. */
export interface Changed {
  sheet: string;
  cell: string;
  stored: StoredValue;
  value: StoredValue;
}

export interface Recalculated {
  /** The new file; the very bytes that came in where no value changed. */
  bytes: Uint8Array;
  notes: RecalcNote[];
  /** Cells with another value than before, in the order in which they stand in the file. */
  changes: Changed[];
  /** Formula cells calculated, WALL cells among them, cells whose stored value changed. */
  counts: { formulas: number; wall: number; changed: number };
  /** The book as it was read, and the calculated one in the engine, for further questions. */
  book: Workbook;
  model: EngineModel;
  sheets: readonly ModelSheet[];
}

/** Two numbers nearer than this are one value: a workbook keeps 15 digits, and its own program may round the last one otherwise. */
const SAME_NUMBER = 1e-13;
/** The engine's value of a cell that refers to itself; what other programs make of it hangs on their settings. */
const CIRCLE = "#CYCLE";
const LOST = "#REF";
/** What the engine says of an INDIRECT in R1C1 notation. */
const NO_R1C1 = "R1C1 notation is not supported.";

/** Recalculates a workbook's formulas and puts the changed values into the original package; every other byte of its parts stays. */
export function recalculate(engine: Engine, bytes: Uint8Array): Recalculated {
  const book = readWorkbook(bytes);
  const { model: first, sheets } = bookModel(engine, book);
  const model = settledModel(engine, first, sheets);
  const notes: RecalcNote[] = [];
  const changes: Changed[] = [];
  const fresh: string[] = [];
  const counts = { formulas: 0, wall: 0, changed: 0 };
  const changed = new Map(book.package.parts);
  let touched = false;
  for (const part of sheets) {
    const edits = editsOf(model, part, notes, counts);
    for (const [cell, { value }] of edits) {
      const stored = part.sheet.cells.get(cell)?.value ?? null;
      if (near(stored, value)) continue;
      changes.push({ sheet: part.sheet.name, cell, stored, value });
      fresh.push(`${part.id}!${cell}`);
    }
    const xml = patchSheet(part.sheet, edits);
    if (xml === part.sheet.xml) continue;
    touched = true;
    changed.set(part.sheet.part, new TextEncoder().encode(xml));
  }
  notes.push(...leftNotes(book.xml, sheets, fresh));
  if (notes.some((n) => n.kind === "left")) {
    const xml = withRecalculation(book.xml);
    if (xml !== book.xml) {
      touched = true;
      changed.set(book.part, new TextEncoder().encode(xml));
    }
  }
  return { bytes: touched ? writePackage({ ...book.package, parts: changed }) : bytes, notes: inOrder(notes, sheets), changes, counts, book, model, sheets };
}

/** A note for each formula that was not calculated. */
function leftNotes(workbookXml: string, sheets: readonly ModelSheet[], fresh: readonly string[]): RecalcNote[] {
  const stale = staleCells(sheets, fresh);
  const unsure = asksRecalculation(workbookXml);
  return sheets.flatMap(({ sheet, id, formulas }) =>
    [...formulas].flatMap(([cell, formula]): RecalcNote[] => {
      if (formula.left === undefined) return [];
      const { reason, byItself } = formula.left;
      const kept = `stored value kept: ${reason}`;
      const isLeft = !byItself && (unsure || formula.cell.value === null || stale.has(`${id}!${cell}`));
      return [{ sheet: sheet.name, cell, ...(isLeft ? { kind: "left", text: `left for Excel, its ${kept}` } : { kind: "kept", text: byItself ? kept : `${kept}; nothing it reads has changed` }) }];
    }),
  );
}

/** Notes in the order in which their cells stand in the file. */
function inOrder(notes: readonly RecalcNote[], sheets: readonly ModelSheet[]): RecalcNote[] {
  const noteOf = new Map(notes.map((n) => [`${n.sheet}!${n.cell}`, n]));
  return sheets.flatMap(({ sheet, formulas }) => [...formulas.keys()].flatMap((cell) => noteOf.get(`${sheet.name}!${cell}`) ?? []));
}

/**
 * A formula stored without an array block shows one value; where the engine would spill it, it is asked for one. A formula that
 * the engine cannot read is left with its stored value, on which others may hang.
 */
function settledModel(engine: Engine, model: EngineModel, sheets: readonly ModelSheet[]): EngineModel {
  const single = new Set<string>();
  let unread = false;
  for (const { id, formulas } of sheets) {
    for (const [reference, formula] of formulas) {
      if (formula.left !== undefined) continue;
      const position = positionOf(id, reference);
      if (model.getters.getCell(position)?.compiledFormula?.isBadExpression) {
        formula.left = { reason: "its formula is in a form not known here", byItself: false };
        unread = true;
      }
      const { value, message } = model.getters.getEvaluatedCell(position);
      if (value === CIRCLE) {
        formula.left = { reason: "it stands in a circle of references, or hangs on one", byItself: false };
        unread = true;
      } else if ((value === LOST || message === NO_R1C1) && /(?<![\w.])INDIRECT\(/i.test(formula.text)) {
        // The engine knows the book's names and some of its sheets by other words.
        formula.left = { reason: "INDIRECT names something not found here", byItself: false };
        unread = true;
      } else if (message?.startsWith(UNKNOWN_FORMAT) && /(?<![\w.])TEXT\(/i.test(formula.text)) {
        formula.left = { reason: message.replace(/\.$/, ""), byItself: false };
        unread = true;
      }
      if (formula.cell.formula?.kind === "array") continue;
      const zone = model.getters.getSpreadZone(position, { ignoreSpillError: true });
      if (zone && (zone.right > zone.left || zone.bottom > zone.top)) single.add(`${id}!${reference}`);
    }
  }
  return single.size === 0 && !unread ? model : modelOf(engine, sheets, single);
}

function editsOf(model: EngineModel, part: ModelSheet, notes: RecalcNote[], counts: Recalculated["counts"]): Map<string, CellEdit> {
  const { sheet, id, formulas, spilled } = part;
  const edits = new Map<string, CellEdit>();
  const alive = new Set<string>();
  const put = (reference: string, value: StoredValue, ref?: string) => {
    const old = sheet.cells.get(reference);
    if (old && near(old.value, value) && (ref === undefined || ref === old.formula?.ref)) return;
    if (!old && value === null) return;
    counts.changed++;
    edits.set(reference, ref === undefined ? { value } : { value, ref });
  };
  for (const [reference, formula] of formulas) {
    if (formula.left !== undefined) continue;
    counts.formulas++;
    if (formula.callsWall) counts.wall++;
    const shown = sheetValue(model.getters.getEvaluatedCell(positionOf(id, reference)));
    const error = errorOf(model, id, reference);
    if (error) notes.push({ sheet: sheet.name, cell: reference, kind: "error", text: error.message === "" ? error.code : `${error.code} ${error.message}` });
    const value = error ? { error: storedErrorCode(error.code) } : (storedValue(shown) ?? 0); // a formula that refers to a blank cell shows 0
    if (formula.cell.formula?.kind !== "array") {
      put(reference, value);
      continue;
    }
    const box = blockOf(model, id, reference, formula);
    put(reference, value, boxName(box));
    const zone = model.getters.getSpreadZone(positionOf(id, reference));
    for (const name of cellsOf(box)) {
      if (name === reference) continue;
      alive.add(name);
      // A fixed block that could not be filled shows its error everywhere.
      put(name, zone ? (valueAt(model, id, name) ?? 0) : value);
    }
  }
  for (const name of spilled.keys()) if (isSpilled(part, name) && !alive.has(name) && !edits.has(name)) put(name, null);
  return edits;
}

/** The block an array formula covers: what it spills to now, or for one of the old, fixed kind the block it was given. */
function blockOf(model: EngineModel, id: string, reference: string, formula: ModelFormula): CellBox {
  const dynamic = formula.cell.attributes["cm"] !== undefined;
  if (!dynamic) return cellBox(formula.cell.formula?.ref ?? reference);
  const zone = model.getters.getSpreadZone(positionOf(id, reference));
  return zone ? { left: zone.left + 1, right: zone.right + 1, top: zone.top + 1, bottom: zone.bottom + 1 } : cellBox(reference);
}

function valueAt(model: EngineModel, id: string, reference: string): StoredValue {
  const error = errorOf(model, id, reference);
  return error ? { error: storedErrorCode(error.code) } : storedValue(sheetValue(model.getters.getEvaluatedCell(positionOf(id, reference))));
}

function errorOf(model: EngineModel, id: string, reference: string): SheetError | undefined {
  const cell = model.getters.getEvaluatedCell(positionOf(id, reference));
  if (cell.type !== "error") return undefined;
  const value = sheetValue({ value: cell.value, message: cell.message });
  return value instanceof SheetError ? value : new SheetError("#VALUE!", String(cell.message ?? ""));
}

function storedValue(value: ReturnType<typeof sheetValue>): StoredValue {
  return value instanceof SheetError ? { error: storedErrorCode(value.code) } : value;
}

function near(a: StoredValue, b: StoredValue): boolean {
  if (typeof a === "number" && typeof b === "number") return Math.abs(a - b) <= SAME_NUMBER * Math.max(Math.abs(a), Math.abs(b));
  if (a !== null && b !== null && typeof a === "object" && typeof b === "object") return a.error === b.error;
  return a === b || (a === null && b === "") || (a === "" && b === null);
}

function positionOf(sheetId: string, reference: string): { sheetId: string; col: number; row: number } {
  const { column, row } = cellPlace(reference);
  return { sheetId, col: column - 1, row: row - 1 };
}
