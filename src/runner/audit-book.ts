import { tableRemarks } from "../cells/reading/table-remarks";
import type { Engine } from "../engine/types";
import { boxName, type CellBox } from "../workbook/cell-reference";
import { blockValues } from "../workbook/method-notes";
import { placeKey } from "../workbook/place-key";
import type { StoredValue } from "../workbook/read-sheet";
import { readWorkbook } from "../workbook/read-workbook";
import { wallCells } from "../workbook/wall-cells";
import { inputFindings } from "./input-findings";
import { recalculate } from "./recalculate";

/** "calculated": the stored values are what comes out; "stale": others come out; "error": an error comes out; "left": it cannot be calculated here. */
export type AuditState = "calculated" | "stale" | "error" | "left";

/** One WALL cell under audit. */
export interface AuditedCell {
  sheet: string;
  cell: string;
  /** The block it fills once calculated. */
  block: string;
  functions: readonly string[];
  state: AuditState;
  /** What is to be said of the state; "" where it is calculated. */
  why: string;
  /** What INPUT_CHECK finds amiss in the inputs of its marches. */
  inputs: readonly string[];
  /** Where its method leaves its valid range. */
  beyond: readonly string[];
  /** The notes of its table. */
  notes: readonly string[];
}

/** Looks at every WALL cell of a book: what is stored against what comes out, the inputs, the valid range, the notes. */
export function auditBook(engine: Engine, bytes: Uint8Array): AuditedCell[] {
  const done = recalculate(engine, bytes);
  const said = new Map(done.notes.map((n) => [placeKey(n.sheet, n.cell), n]));
  const before = wallCells(done.book);
  const after = done.bytes === bytes ? before : wallCells(readWorkbook(done.bytes));
  const findingsOf = inputFindings(done.model);
  const stored = new Map(before.map((c) => [placeKey(c.sheet.name, c.cell.reference), c]));
  return after.map((wall) => {
    const { sheet, cell, box, functions } = wall;
    const key = placeKey(sheet.name, cell.reference);
    const old = stored.get(key)!;
    const note = said.get(key);
    const both = union(old.box, box);
    const [was, is] = [old, wall].map((c) => blockValues({ sheet: c.sheet, box: both }).flat());
    const differing = was!.filter((value, i) => !same(value, is![i]!)).length;
    const part = done.sheets.find((s) => s.sheet.name === sheet.name)!;
    const formula = part.formulas.get(cell.reference)!;
    const isLeft = note?.kind === "left" || note?.kind === "kept";
    const state: AuditState = isLeft ? "left" : note?.kind === "error" ? "error" : differing > 0 ? "stale" : "calculated";
    return {
      sheet: sheet.name,
      cell: cell.reference,
      block: boxName(box),
      functions,
      state,
      why: note?.text ?? (differing > 0 ? `${differing} of ${was!.length} stored values differ from what comes out` : ""),
      inputs: isLeft ? [] : findingsOf(part.id, formula.text),
      ...tableRemarks(blockValues(wall)),
    };
  });
}

/** The cell has something that wants looking at; notes alone do not. */
export function hasFinding({ state, inputs, beyond }: AuditedCell): boolean {
  return state !== "calculated" || inputs.length > 0 || beyond.length > 0;
}

function union(a: CellBox, b: CellBox): CellBox {
  return { left: Math.min(a.left, b.left), top: Math.min(a.top, b.top), right: Math.max(a.right, b.right), bottom: Math.max(a.bottom, b.bottom) };
}

/**
 * Numbers nearer than this are one: another JavaScript engine (Excel's, a browser's) may differ in the last digit of exp and pow, and a
 * march's choice of steps with it: up to 7e-10 seen between Chromium and Node.
 */
const SAME_NUMBER = 1e-8;

/** Blank and empty text show alike. */
function same(a: StoredValue, b: StoredValue): boolean {
  if (a !== null && b !== null && typeof a === "object" && typeof b === "object") return a.error === b.error;
  if (typeof a === "number" && typeof b === "number") return Math.abs(a - b) <= SAME_NUMBER * Math.max(Math.abs(a), Math.abs(b));
  return (a ?? "") === (b ?? "");
}
