import { boxName, cellBox, cellName, cellPlace, type CellBox } from "./cell-reference";
import type { StoredCell, StoredValue } from "./read-sheet";
import type { BookSheet } from "./read-workbook";
import { attributes, xmlText } from "./xml-text";

/** What becomes of one cell. */
export interface CellEdit {
  /** The new value; null empties the cell but keeps its style. */
  value: StoredValue;
  /** New block of the array formula that stands here. */
  ref?: string;
}

/** One replacement in the part's text. */
export interface Cut {
  at: number;
  length: number;
  text: string;
}

/** The sheet part with the edited cells replaced and new ones put in; every other byte stays. The same text where nothing changes. */
export function patchSheet(sheet: Pick<BookSheet, "xml" | "cells">, edits: ReadonlyMap<string, CellEdit>): string {
  const { xml, cells } = sheet;
  const prefix = /<([\w.-]+:)?sheetData(?=[\s/>])/.exec(xml)?.[1] ?? "";
  const cuts: Cut[] = [];
  const added = new Map<number, { column: number; text: string }[]>();
  for (const [reference, edit] of edits) {
    const cell = cells.get(reference);
    if (cell) {
      const text = changedCell(xml, cell, edit, prefix);
      if (text !== undefined) cuts.push({ at: cell.at, length: cell.length, text });
      continue;
    }
    const { type, inside } = valueXml(edit.value, prefix);
    if (inside === "") continue;
    const { row, column } = cellPlace(reference);
    const list = added.get(row) ?? [];
    list.push({ column, text: `<${prefix}c r="${reference}"${type}>${inside}</${prefix}c>` });
    added.set(row, list);
  }
  if (added.size > 0) addCells(xml, cells, added, prefix, cuts);
  if (cuts.length === 0) return xml;
  widenDimension(xml, [...edits.entries()].filter(([, e]) => e.value !== null).map(([r]) => r), cuts);
  return applied(xml, cuts);
}

function changedCell(xml: string, cell: StoredCell, edit: CellEdit, prefix: string): string | undefined {
  const newRef = edit.ref !== undefined && edit.ref !== cell.formula?.ref ? edit.ref : undefined;
  if (newRef === undefined && same(cell.value, edit.value)) return undefined;
  const written = xml.slice(cell.at, cell.at + cell.length);
  const head = /^<(?:[\w.-]+:)?c(?=[\s/>])((?:"[^"]*"|'[^']*'|[^>"'])*?)\/?>/.exec(written)![1]!.replace(/\s+t=(?:"[^"]*"|'[^']*')/, "");
  let formula = /<(?:[\w.-]+:)?f(?=[\s/>])(?:"[^"]*"|'[^']*'|[^>"'])*?(?:\/>|>[\s\S]*?<\/(?:[\w.-]+:)?f\s*>)/.exec(written)?.[0] ?? "";
  if (newRef !== undefined) formula = formula.replace(/(\sref=)(?:"[^"]*"|'[^']*')/, `$1"${newRef}"`);
  const { type, inside } = valueXml(edit.value, prefix);
  return formula === "" && inside === "" ? `<${prefix}c${head}/>` : `<${prefix}c${head}${type}>${formula}${inside}</${prefix}c>`;
}

function same(a: StoredValue, b: StoredValue): boolean {
  if (a !== null && b !== null && typeof a === "object" && typeof b === "object") return a.error === b.error;
  // An empty text and an empty cell show alike; a formula's empty text is stored without a value by some writers.
  return a === b || (a === null && b === "") || (a === "" && b === null);
}

function valueXml(value: StoredValue, prefix: string): { type: string; inside: string } {
  const v = (text: string) => `<${prefix}v>${text}</${prefix}v>`;
  if (value === null) return { type: "", inside: "" };
  if (typeof value === "number") return { type: "", inside: v(String(value)) };
  if (typeof value === "boolean") return { type: ' t="b"', inside: v(value ? "1" : "0") };
  if (typeof value === "string") return { type: ' t="str"', inside: v(xmlText(value)) };
  return { type: ' t="e"', inside: v(xmlText(value.error)) };
}

/** Puts new cells into their rows in column order, new rows between the old ones. */
function addCells(xml: string, cells: ReadonlyMap<string, StoredCell>, added: Map<number, { column: number; text: string }[]>, prefix: string, cuts: Cut[]): void {
  const rows = rowsOf(xml);
  const empty = /<(?:[\w.-]+:)?sheetData\s*\/>/.exec(xml);
  const dataEnd = empty ? -1 : xml.search(/<\/(?:[\w.-]+:)?sheetData\s*>/);
  const standing = new Map<number, { column: number; at: number; end: number }[]>();
  for (const cell of cells.values()) {
    const { row, column } = cellPlace(cell.reference);
    if (!added.has(row)) continue;
    const list = standing.get(row) ?? [];
    list.push({ column, at: cell.at, end: cell.at + cell.length });
    standing.set(row, list);
  }
  const newRows: string[] = [];
  let next = 0;
  for (const [number, list] of [...added].sort((a, b) => a[0] - b[0])) {
    list.sort((a, b) => a.column - b.column);
    while (next < rows.length && rows[next]!.number < number) next++; // rows stand in order
    const row = rows[next]?.number === number ? rows[next] : undefined;
    const inside = list.map((c) => c.text).join("");
    if (!row) {
      const text = `<${prefix}row r="${number}">${inside}</${prefix}row>`;
      const after = rows[next];
      if (empty) newRows.push(text);
      else cuts.push({ at: after?.at ?? dataEnd, length: 0, text });
      continue;
    }
    const tag = spansWidened(row.tag, list[0]!.column, list.at(-1)!.column);
    if (row.isEmpty) {
      cuts.push({ at: row.at, length: row.tag.length, text: tag.replace(/\s*\/>$/, ">") + inside + `</${prefix}row>` });
      continue;
    }
    if (tag !== row.tag) cuts.push({ at: row.at, length: row.tag.length, text: tag });
    const old = (standing.get(number) ?? []).sort((a, b) => a.column - b.column);
    for (const { column, text } of list) {
      const next = old.find((c) => c.column > column);
      cuts.push({ at: next?.at ?? old.at(-1)?.end ?? row.at + row.tag.length, length: 0, text });
    }
  }
  if (empty && newRows.length > 0) cuts.push({ at: empty.index, length: empty[0].length, text: `<${prefix}sheetData>${newRows.join("")}</${prefix}sheetData>` });
}

function rowsOf(xml: string): { number: number; at: number; tag: string; isEmpty: boolean }[] {
  let number = 0;
  return [...xml.matchAll(/<(?:[\w.-]+:)?row(?=[\s/>])((?:[^<>"']|"[^"<]*"|'[^'<]*')*)>/g)].map((m) => {
    number = Number(attributes(m[1]!)["r"] ?? number + 1);
    return { number, at: m.index, tag: m[0], isEmpty: m[1]!.endsWith("/") };
  });
}

/** The row's `spans` hint must hold its cells; it is widened, never narrowed. */
function spansWidened(tag: string, from: number, to: number): string {
  return tag.replace(/(\sspans=["'])(\d+):(\d+)/, (_whole, before: string, low: string, high: string) => `${before}${Math.min(Number(low), from)}:${Math.max(Number(high), to)}`);
}

/** The sheet's used block grows with what was added; it never shrinks. */
function widenDimension(xml: string, references: readonly string[], cuts: Cut[]): void {
  const m = /<(?:[\w.-]+:)?dimension\s(?:"[^"]*"|'[^']*'|[^>"'])*?ref=["']([A-Z0-9:$]+)["']/i.exec(xml);
  if (!m) return;
  const old = cellBox(m[1]!);
  const box: CellBox = { ...old };
  for (const reference of references) {
    const { row, column } = cellPlace(reference);
    box.left = Math.min(box.left, column);
    box.right = Math.max(box.right, column);
    box.top = Math.min(box.top, row);
    box.bottom = Math.max(box.bottom, row);
  }
  if (box.left === old.left && box.right === old.right && box.top === old.top && box.bottom === old.bottom) return;
  cuts.push({ at: m.index + m[0].lastIndexOf(m[1]!), length: m[1]!.length, text: boxName(box) });
}

/** The text with its cuts made. Cuts at one place keep the order in which they were made: cells are added in column order. */
export function applied(xml: string, cuts: readonly Cut[]): string {
  const ordered = cuts.map((cut, order) => ({ ...cut, order })).sort((a, b) => a.at - b.at || Number(a.length > 0) - Number(b.length > 0) || a.order - b.order);
  let out = "";
  let from = 0;
  for (const cut of ordered) {
    out += xml.slice(from, cut.at) + cut.text;
    from = cut.at + cut.length;
  }
  return out + xml.slice(from);
}

/** Every cell of a block, row by row. */
export function cellsOf(box: CellBox): string[] {
  const names: string[] = [];
  for (let row = box.top; row <= box.bottom; row++) for (let column = box.left; column <= box.right; column++) names.push(cellName(column, row));
  return names;
}
