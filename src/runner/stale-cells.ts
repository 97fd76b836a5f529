import { boxSize, cellPlace } from "../workbook/cell-reference";
import { cellsOf } from "../workbook/patch-sheet";
import { referencesRead, type ReferencesRead } from "../workbook/references-read";
import type { ModelSheet } from "./book-model";

/** Comparisons of a formula's blocks with touched cells after which the rest counts as stale: a hostile book must not hold up the run. */
const MOST_WORK = 20_000_000;

/** A what-if table does not say in a formula what it reads. */
const UNNAMED: ReferencesRead = { blocks: [], more: true };

/**
 * Formulas left with their stored value although something they read has changed, as `sheet id!cell`. A calculated formula that
 * reads such a cell passes the doubt on. `changed` lists the cells with a new value in the same spelling.
 */
export function staleCells(sheets: readonly ModelSheet[], changed: Iterable<string>): Set<string> {
  const touched = new Map<string, Set<string>>();
  const touch = (id: string, cell: string) => (touched.get(id.toLowerCase()) ?? touched.set(id.toLowerCase(), new Set()).get(id.toLowerCase())!).add(cell);
  let any = false;
  for (const name of changed) {
    const mark = name.lastIndexOf("!");
    touch(name.slice(0, mark), name.slice(mark + 1));
    any = true;
  }
  const stale = new Set<string>();
  if (!any) return stale;
  const left = sheets.flatMap(({ id, formulas }) => [...formulas].filter(([, f]) => f.left !== undefined && !f.left.byItself).map(([cell, f]) => ({ id, cell, reads: f.cell.formula?.kind === "dataTable" ? UNNAMED : referencesRead(f.text, id) })));
  if (left.length === 0) return stale;
  let work = 0;
  // Only called where something is touched: cells not named in a formula's text may be among it.
  const reads = ({ blocks, more }: ReferencesRead): boolean =>
    work > MOST_WORK ||
    more ||
    blocks.some(({ sheet, box }) => {
      const cells = touched.get(sheet.toLowerCase());
      if (!cells) return false;
      work += 1 + Math.min(cells.size, boxSize(box));
      if (boxSize(box) <= cells.size) return cellsOf(box).some((c) => cells.has(c));
      return [...cells].some((c) => {
        const { row, column } = cellPlace(c);
        return row >= box.top && row <= box.bottom && column >= box.left && column <= box.right;
      });
    });

  let waiting = left.filter(({ id, cell, reads: r }) => !(reads(r) && stale.add(`${id}!${cell}`)));
  if (stale.size === 0 || waiting.length === 0) return stale;
  // From here on only what hangs on a stale cell counts; calculated cells carry it further.
  touched.clear();
  for (const { id, formulas, spilled } of sheets) {
    for (const cell of formulas.keys()) if (stale.has(`${id}!${cell}`)) touch(id, cell);
    for (const [cell, source] of spilled) if (stale.has(`${id}!${source}`)) touch(id, cell);
  }
  let calculated = sheets.flatMap(({ id, formulas }) => [...formulas].filter(([, f]) => f.left === undefined).map(([cell, f]) => ({ id, cell, reads: referencesRead(f.text, id) })));
  for (let before = -1; before !== waiting.length + calculated.length && waiting.length > 0; ) {
    before = waiting.length + calculated.length;
    waiting = waiting.filter(({ id, cell, reads: r }) => {
      if (!reads(r)) return true;
      stale.add(`${id}!${cell}`);
      touch(id, cell);
      return false;
    });
    calculated = calculated.filter(({ id, cell, reads: r }) => {
      if (!reads(r)) return true;
      touch(id, cell);
      return false;
    });
  }
  return stale;
}
