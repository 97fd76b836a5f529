import { openPackage, partText, WorkbookError, type BookPackage } from "./open-package";
import { readSheet, richText, type StoredCell } from "./read-sheet";
import { relationships } from "./relationships";
import { attributes, elements, plainXml } from "./xml-text";

export interface BookSheet {
  name: string;
  /** Path of its part. */
  part: string;
  xml: string;
  cells: Map<string, StoredCell>;
}

/** A defined name. */
export interface BookName {
  name: string;
  /** The sheet it is local to; undefined for the whole book. */
  sheet: string | undefined;
  text: string;
}

/** A table: its block, heading and totals rows, and columns. */
export interface BookTable {
  name: string;
  sheet: string;
  ref: string;
  hasHeadings: boolean;
  hasTotals: boolean;
  columns: string[];
}

export interface Workbook {
  package: BookPackage;
  /** Path of the workbook part. */
  part: string;
  xml: string;
  sheets: BookSheet[];
  names: BookName[];
  tables: BookTable[];
  /** Days are counted from 1904. */
  from1904: boolean;
}

/** Reads what a recalculation needs of a workbook; everything else stays as bytes. */
export function readWorkbook(bytes: Uint8Array): Workbook {
  const book = openPackage(bytes);
  const part = relationships(book, "").find((r) => r.kind === "officeDocument")?.target ?? "xl/workbook.xml";
  if (!book.parts.has(part)) throw new WorkbookError("The file is not an .xlsx book: its package holds no workbook.");
  const xml = partText(book, part);
  const links = relationships(book, part);
  const stringsPart = links.find((r) => r.kind === "sharedStrings")?.target;
  const strings = stringsPart !== undefined && book.parts.has(stringsPart) ? elements(partText(book, stringsPart), "si").map((e) => richText(e.inside)) : [];
  const listed = elements(xml, "sheet").map((e) => e.attributes);
  const sheets: BookSheet[] = [];
  const tables: BookTable[] = [];
  for (const a of listed) {
    const id = Object.entries(a).find(([key]) => /(^|:)id$/.test(key) && key !== "sheetId")?.[1];
    const link = links.find((r) => r.id === id);
    if (link?.kind !== "worksheet") continue; // chart sheets and dialogs hold no cells
    const sheetXml = partText(book, link.target);
    sheets.push({ name: a["name"] ?? "", part: link.target, xml: sheetXml, cells: readSheet(sheetXml, strings) });
    for (const r of relationships(book, link.target)) if (r.kind === "table") tables.push(readTable(partText(book, r.target), a["name"] ?? ""));
  }
  if (sheets.length === 0) throw new WorkbookError("The book holds no worksheet.");
  const names = elements(xml, "definedName")
    .map((e) => ({
      name: e.attributes["name"] ?? "",
      sheet: e.attributes["localSheetId"] === undefined ? undefined : listed[Number(e.attributes["localSheetId"])]?.["name"],
      text: plainXml(e.inside),
    }))
    .filter((n) => !n.name.startsWith("_xlnm."));
  return { package: book, part, xml, sheets, names, tables, from1904: /\sdate1904\s*=\s*["'](?:1|true)["']/.test(xml) };
}

function readTable(xml: string, sheet: string): BookTable {
  const a = attributes(/<(?:[\w.-]+:)?table(?=[\s>])([^>]*)>/.exec(xml)?.[1] ?? "");
  return {
    name: a["displayName"] ?? a["name"] ?? "",
    sheet,
    ref: a["ref"] ?? "A1",
    hasHeadings: a["headerRowCount"] !== "0",
    hasTotals: Number(a["totalsRowCount"] ?? 0) > 0,
    columns: elements(xml, "tableColumn").map((e) => e.attributes["name"] ?? ""),
  };
}
