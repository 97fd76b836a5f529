import { cellName, cellPlace } from "./cell-reference";
import { WorkbookError } from "./workbook-error";
import { elements, plainText, plainXml, scanElements, type XmlElement } from "./xml-text";

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

const ROW = /<(?:[\w.-]+:)?row(?=[\s/>])((?:[^<>"']|"[^"<]*"|'[^'<]*')*)>/g;

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
  for (const element of scanElements(xml, "c", begin, end)) {
    while (next < rows.length && rows[next]!.at < element.at) {
      row = rows[next]!.number ?? row + 1;
      column = 0;
      next++;
    }
    const reference = element.attributes["r"] ?? cellName(column + 1, row);
    column = cellPlace(reference).column;
    cells.set(reference, { reference, attributes: element.attributes, ...content(reference, element, strings), at: element.at, length: element.length });
  }
  return cells;
}

function rowStarts(xml: string, begin: number, end: number): { at: number; number: number | undefined }[] {
  const rows: { at: number; number: number | undefined }[] = [];
  ROW.lastIndex = begin;
  for (let m = ROW.exec(xml); m && m.index < end; m = ROW.exec(xml)) {
    const r = /\sr="(\d+)"/.exec(m[1]!)?.[1];
    rows.push({ at: m.index, number: r === undefined ? undefined : Number(r) });
  }
  return rows;
}

function content(reference: string, { attributes: { t: type }, inside }: XmlElement, strings: readonly string[]): Pick<StoredCell, "formula" | "value"> {
  const f = elements(inside, "f")[0];
  const v = elements(inside, "v")[0]?.inside;
  const formula: StoredFormula | undefined = f && {
    text: plainXml(f.inside),
    kind: (f.attributes["t"] as StoredFormula["kind"] | undefined) ?? "plain",
    ...(f.attributes["ref"] === undefined ? {} : { ref: f.attributes["ref"] }),
    ...(f.attributes["si"] === undefined ? {} : { shared: f.attributes["si"] }),
  };
  return { ...(formula ? { formula } : {}), value: valueOf(reference, type, inside, v, strings) };
}

function valueOf(reference: string, type: string | undefined, inside: string, v: string | undefined, strings: readonly string[]): StoredValue {
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
      return v.trim() === "" ? null : numberOf(reference, v);
  }
}

/** The plain characters of rich text, phonetic guides left out. */
export function richText(inside: string): string {
  const bare = inside.replace(/<(?:[\w.-]+:)?rPh(?=[\s>])[\s\S]*?<\/(?:[\w.-]+:)?rPh\s*>/g, "");
  return elements(bare, "t").map((t) => plainText(t.inside)).join("");
}

function numberOf(reference: string, text: string): number {
  const value = Number(text);
  if (!Number.isFinite(value)) throw new WorkbookError(`The file is damaged: its cell ${reference} holds "${text.slice(0, 30)}" where a number should stand.`);
  return value;
}
