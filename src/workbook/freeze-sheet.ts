import { cellFormulas } from "./cell-formulas";
import { boxSize, type CellBox } from "./cell-reference";
import { cellsInside } from "./cells-inside";
import { applied, type Cut } from "./patch-sheet";
import type { StoredCell } from "./read-sheet";
import type { BookSheet } from "./read-workbook";
import { elements, formulaXml, plainXml } from "./xml-text";

const FORMULA = /<(?:[\w.-]+:)?f(?=[\s/>])(?:"[^"]*"|'[^']*'|[^>"'])*?(?:\/>|>[\s\S]*?<\/(?:[\w.-]+:)?f\s*>)/;
/** Formulas outside cells: conditional formats, validations and their newer kin. */
const OUTSIDE_CELLS = ["f", "formula", "formula1", "formula2"];

/**
 * The sheet part with the formulas of some cells taken away, their stored values left as they are, and the marks of dynamic arrays
 * with them; in all other formulas of the sheet `mended` may change the text. Every other byte stays.
 */
export function freezeSheet(sheet: Pick<BookSheet, "xml" | "cells">, frozen: ReadonlyMap<string, CellBox>, mended: (formula: string, reference: string) => string): string {
  const { xml, cells } = sheet;
  const cuts: Cut[] = [];
  const bare = new Set<string>();
  for (const [reference, box] of frozen) {
    bare.add(reference);
    if (boxSize(box) > 1) for (const inside of cellsInside(box, cells)) if (!cells.get(inside)!.formula) bare.add(inside);
  }
  for (const reference of bare) {
    const cell = cells.get(reference)!;
    const written = xml.slice(cell.at, cell.at + cell.length);
    const text = withoutFormula(written);
    if (text !== written) cuts.push({ at: cell.at, length: cell.length, text });
  }
  cuts.push(...mendedCells(sheet, bare, mended), ...mendedElsewhere(xml, mended));
  return cuts.length === 0 ? xml : applied(xml, cuts);
}

/** `<c r="D3" cm="1"><f …>…</f><v>2</v></c>` → `<c r="D3"><v>2</v></c>`. */
function withoutFormula(written: string): string {
  const end = /^<(?:"[^"]*"|'[^']*'|[^>"'])*>/.exec(written)![0].length;
  const start = written.slice(0, end).replace(/\s(?:cm|vm)=(?:"[^"]*"|'[^']*')/g, "");
  const inside = written.slice(end).replace(FORMULA, "");
  // A formula without a value leaves an empty cell, whose type would promise one.
  return (/^<\//.test(inside) ? start.replace(/\st=(?:"[^"]*"|'[^']*')/, "") : start) + inside;
}

/** Changed formulas of cells that keep theirs; where a shared formula changes in one cell, each of its cells gets its own text. */
function mendedCells({ xml, cells }: Pick<BookSheet, "xml" | "cells">, bare: ReadonlySet<string>, mended: (formula: string, reference: string) => string): Cut[] {
  const texts = [...cellFormulas(cells)].filter(([reference]) => !bare.has(reference)).map(([reference, old]) => ({ cell: cells.get(reference)!, old, text: mended(old, reference) }));
  const isShared = (cell: StoredCell) => cell.formula?.kind === "shared";
  const split = new Set(texts.filter(({ cell, old, text }) => isShared(cell) && text !== old).map(({ cell }) => cell.formula!.shared));
  return texts.flatMap(({ cell, old, text }) => {
    const apart = isShared(cell) && split.has(cell.formula!.shared);
    if (text === old && !apart) return [];
    const written = xml.slice(cell.at, cell.at + cell.length);
    const formula = FORMULA.exec(written)![0];
    const [, name, inside] = /^<((?:[\w.-]+:)?f)((?:"[^"]*"|'[^']*'|[^>"'])*?)\/?>/.exec(formula)!;
    const head = apart ? inside!.replace(/\s(?:t|si|ref)=(?:"[^"]*"|'[^']*')/g, "") : inside!;
    return [{ at: cell.at, length: cell.length, text: written.replace(FORMULA, () => `<${name}${head}>${formulaXml(text)}</${name}>`) }];
  });
}

function mendedElsewhere(xml: string, mended: (formula: string, reference: string) => string): Cut[] {
  const end = xml.search(/<\/(?:[\w.-]+:)?sheetData\s*>|<(?:[\w.-]+:)?sheetData\s*\/>/);
  if (end < 0) return [];
  return OUTSIDE_CELLS.flatMap((name) => elements(xml.slice(end), name)).flatMap(({ inside, at, length }) => {
    if (inside.includes("<")) return []; // newer kinds hold their formula in an element of its own, which is found by itself
    const old = plainXml(inside);
    const text = mended(old, "A1");
    if (text === old) return [];
    const element = xml.slice(end + at, end + at + length);
    const from = element.lastIndexOf(inside + "</");
    return [{ at: end + at + from, length: inside.length, text: formulaXml(text) }];
  });
}
