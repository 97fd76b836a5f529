import type { Workbook } from "../workbook/read-workbook";

/** Parts of a package that the grid has no place for, by the beginning of their path, and what they are called. */
const LOST: readonly (readonly [pattern: RegExp, words: string])[] = [
  [/vbaProject\.bin$/i, "macros"],
  [/\/pivotTables\//i, "pivot tables"],
  [/\/(comments|threadedComments)/i, "comments"],
  [/\/externalLinks\//i, "links to other books"],
  [/\/media\//i, "pictures"],
  [/\/(activeX|ctrlProps|embeddings)\//i, "controls and embedded objects"],
  [/\/(slicers|slicerCaches|timelines)\//i, "slicers"],
  [/\/(queryTables|connections\.xml)/i, "data connections"],
  [/\/diagrams\//i, "diagrams"],
  [/\/printerSettings\//i, "printer settings"],
];

/** What of a book the bench does not keep when it saves, in words. */
export function lostParts(book: Workbook): string[] {
  const names = [...book.package.parts.keys()];
  const found = LOST.filter(([pattern]) => names.some((name) => pattern.test("/" + name))).map(([, words]) => words);
  if (book.names.length > 0) found.push("defined names (formulas get what they stand for)");
  if (book.from1904) found.push("days counted from 1904");
  if (/<(?:\w+:)?workbookProtection\b/.test(book.xml) || book.sheets.some((s) => /<(?:\w+:)?sheetProtection\b/.test(s.xml))) found.push("protection");
  return found;
}
