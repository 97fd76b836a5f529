import { attributes, elements, plainText, plainXml } from "./xml-text";

/** What a cell's value is in the file. */
export type StoredValue = number | string | boolean | null | { error: string };

/** The formula element of a cell. */
export interface StoredFormula {
  /** As written, entities resolved; "" where a shared formula is only referred to. */
  text: string;
  kind: "plain" | "shared" | "array" | "dataTable";
  /** Block an array or shared formula covers. */
  ref?: string;
  /** Number of a shared formula. */
  shared?: string;
}

/** One `<c>` element and where it stands in the part. */
export interface StoredCell {
  reference: string;
  attributes: Record<string, string>;
  formula?: StoredFormula;
  value: StoredValue;
  at: number;
  length: number;
}

const CELL = /<(?:[\w.-]+:)?c(?=[\s/>])((?:"[^"]*"|'[^']*'|[^>"'])*?)(?:\/>|>([\s\S]*?)<\/(?:[\w.-]+:)?c\s*>)/g;
const ROW_OR_CELL = /<(?:[\w.-]+:)?row(?=[\s/>])((?:"[^"]*"|'[^']*'|[^>"'])*)>/g;

/** Reads the cells of a sheet part. Cells without an address (allowed by the standard) are given theirs by counting. */
export function readSheet(xml: string, strings: readonly string[]): Map<string, StoredCell> {
  const cells = new Map<string, StoredCell>();
  const begin = xml.search(/<(?:[\w.-]+:)?sheetData(?=[\s/>])/);
  const end = xml.search(/<\/(?:[\w.-]+:)?sheetData\s*>/);
  if (begin < 0 || end < 0) return cells;
  const rows = rowStarts(xml, begin, end);
  let row = 0;
  let column = 0;
  let next = 0;
  CELL.lastIndex = begin;
  for (let m = CELL.exec(xml); m && m.index < end; m = CELL.exec(xml)) {
    while (next < rows.length && rows[next]!.at < m.index) {
      row = rows[next]!.number ?? row + 1;
      column = 0;
      next++;
    }
    const a = attributes(m[1]!);
    const reference = a["r"] ?? letters(column + 1) + row;
    column = columnOf(reference);
    cells.set(reference, { reference, attributes: a, ...content(a["t"], m[2] ?? "", strings), at: m.index, length: m[0].length });
  }
  return cells;
}

function rowStarts(xml: string, begin: number, end: number): { at: number; number: number | undefined }[] {
  const rows: { at: number; number: number | undefined }[] = [];
  ROW_OR_CELL.lastIndex = begin;
  for (let m = ROW_OR_CELL.exec(xml); m && m.index < end; m = ROW_OR_CELL.exec(xml)) {
    const r = /\sr="(\d+)"/.exec(m[1]!)?.[1];
    rows.push({ at: m.index, number: r === undefined ? undefined : Number(r) });
  }
  return rows;
}

function content(type: string | undefined, inside: string, strings: readonly string[]): Pick<StoredCell, "formula" | "value"> {
  const f = elements(inside, "f")[0];
  const v = elements(inside, "v")[0]?.inside;
  const formula: StoredFormula | undefined = f && {
    text: plainXml(f.inside),
    kind: (f.attributes["t"] as StoredFormula["kind"] | undefined) ?? "plain",
    ...(f.attributes["ref"] === undefined ? {} : { ref: f.attributes["ref"] }),
    ...(f.attributes["si"] === undefined ? {} : { shared: f.attributes["si"] }),
  };
  return { ...(formula ? { formula } : {}), value: valueOf(type, inside, v, strings) };
}

function valueOf(type: string | undefined, inside: string, v: string | undefined, strings: readonly string[]): StoredValue {
  if (type === "inlineStr") return richText(elements(inside, "is")[0]?.inside ?? "");
  if (v === undefined) return null;
  switch (type) {
    case "s":
      return strings[Number(v)] ?? "";
    case "b":
      return v === "1" || v === "true";
    case "e":
      return { error: plainXml(v) };
    case "str":
    case "d":
      return plainText(v);
    default:
      return Number(v);
  }
}

/** The plain characters of rich text, phonetic guides left out. */
export function richText(inside: string): string {
  const bare = inside.replace(/<(?:[\w.-]+:)?rPh(?=[\s>])[\s\S]*?<\/(?:[\w.-]+:)?rPh\s*>/g, "");
  return elements(bare, "t").map((t) => plainText(t.inside)).join("");
}

function letters(column: number): string {
  return column < 1 ? "" : letters(Math.floor((column - 1) / 26)) + String.fromCharCode(65 + ((column - 1) % 26));
}

function columnOf(reference: string): number {
  let n = 0;
  for (const c of reference) {
    if (c >= "0" && c <= "9") break;
    n = n * 26 + c.toUpperCase().charCodeAt(0) - 64;
  }
  return n;
}
