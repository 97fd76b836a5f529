import { strToU8 } from "fflate";
import { addSheet, firstFree } from "./add-sheet";
import { cellPlace, type CellBox } from "./cell-reference";
import { dropCalcChain } from "./drop-calc-chain";
import { freezeSheet } from "./freeze-sheet";
import { methodNotes, type NotesRequest } from "./method-notes";
import { partText } from "./open-package";
import { placeKey } from "./place-key";
import { formulaReader } from "./plain-formula";
import type { Workbook } from "./read-workbook";
import { relationships } from "./relationships";
import { spillBlocks, type BlockOf } from "./spill-blocks";
import { textSheet } from "./text-sheet";
import { isWallCall } from "./wall-call";
import { wallCells, type WallCell } from "./wall-cells";
import { writePackage } from "./write-package";
import { elements, formulaXml, plainXml } from "./xml-text";

/** Widths of the notes' columns, in characters; the last one's texts run on to the right. */
const WIDTHS = [16, 8, 16, 110];
const SHEET_NAME = "method notes";

export interface PlainCopy {
  bytes: Uint8Array;
  /** The cells that were frozen. */
  cells: readonly WallCell[];
  /** Name of the sheet with the method notes. */
  notesSheet: string;
  /** What still calls our functions: defined names, conditional formats, validations, none of which can hold values. */
  remaining: readonly string[];
}

/**
 * The book for someone without our functions: each cell that calls one, and the block it spilled, keeps its stored values and loses its
 * formula; a new last sheet tells how they were calculated. Spill references to such blocks become plain ranges. The parts that need not
 * change for this stay byte for byte. A pure function: the date, and all words about methods, come from the caller.
 */
export function plainCopy(book: Workbook, request: NotesRequest): PlainCopy {
  const cells = wallCells(book);
  const blocks = new Map(cells.filter(({ cell }) => cell.formula?.kind === "array").map(({ sheet, cell, box }) => [placeKey(sheet.name, cell.reference), box]));
  const read = formulaReader(book);
  const blockOf = (own: string): BlockOf => (sheet, reference) => blocks.get(placeKey(sheet ?? own, reference));
  const mended = (own: string) => (formula: string, at: string) => spillBlocks(formula, blockOf(own), (name) => read(name, own, cellPlace(at)).text.slice(1));

  const parts = new Map(book.package.parts);
  for (const sheet of book.sheets) {
    const frozen = new Map<string, CellBox>(cells.filter((c) => c.sheet === sheet).map(({ cell, box }) => [cell.reference, box]));
    const xml = freezeSheet(sheet, frozen, mended(sheet.name));
    if (xml !== sheet.xml) parts.set(sheet.part, strToU8(xml));
    for (const { kind, target } of relationships(book.package, sheet.part)) if (kind === "table") mendTable(target);
  }
  const names = book.xml.replace(/(<(?:[\w.-]+:)?definedName(?=\s)(?:"[^"]*"|'[^']*'|[^>"'])*>)([^<]*)/g, (whole, tag: string, inside: string) => {
    const old = plainXml(inside);
    const text = mended("")(old, "A1");
    return text === old ? whole : tag + formulaXml(text);
  });
  if (names !== book.xml) parts.set(book.part, strToU8(names));

  const taken = new Set(elements(book.xml, "sheet").map((e) => (e.attributes["name"] ?? "").toLowerCase()));
  const notesSheet = firstFree((n) => (n === 1 ? SHEET_NAME : `${SHEET_NAME} ${n}`), (name) => taken.has(name.toLowerCase()));
  const remaining = remainingCalls(book);
  const rows = methodNotes(cells, remaining, read, blocks, request);
  const chained = dropCalcChain({ ...book.package, parts }, book.part);
  const withNotes = addSheet({ ...book.package, parts: chained }, book.part, { name: notesSheet, xml: (namespace) => textSheet(namespace, rows.rows, WIDTHS, rows.headingRows) });
  return { bytes: writePackage({ ...book.package, parts: withNotes }), cells, notesSheet, remaining };

  /** The formula by which a table fills its new rows goes away where it calls one of our functions, and reads blocks where it read spills. */
  function mendTable(part: string): void {
    const old = partText(book.package, part);
    const xml = old.replace(/<((?:[\w.-]+:)?calculatedColumnFormula)(?=[\s>])[^>]*>([\s\S]*?)<\/\1\s*>/g, (whole, _name, inside: string) => (callsWall(plainXml(inside)) ? "" : whole));
    if (xml !== old) parts.set(part, strToU8(xml));
  }

  function remainingCalls({ sheets, names: defined }: Workbook): string[] {
    const ofNames = defined.filter((n) => callsWall(n.text)).map((n) => `the name ${n.name}`);
    const ofSheets = sheets.flatMap(({ name, xml }) => {
      const tail = xml.slice(Math.max(0, xml.search(/<\/(?:[\w.-]+:)?sheetData\s*>/)));
      return (["conditionalFormatting", "dataValidation"] as const)
        .filter((element) => elements(tail, element).some((e) => ["f", "formula", "formula1", "formula2"].some((f) => elements(e.inside, f).some((x) => !x.inside.includes("<") && callsWall(plainXml(x.inside))))))
        .map((element) => `a ${element === "dataValidation" ? "validation" : "conditional format"} of the sheet ${name}`);
    });
    return [...ofNames, ...ofSheets];
  }

  function callsWall(formula: string): boolean {
    return read(formula.replace(/^=/, ""), "", { column: 1, row: 1 }).functions.some(isWallCall);
  }
}
