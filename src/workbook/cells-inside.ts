import { boxSize, cellPlace, type CellBox } from "./cell-reference";
import { cellsOf } from "./patch-sheet";
import type { StoredCell } from "./read-sheet";

/** The stored cells of a block, found the shorter way: a hostile file may claim a block of the whole sheet. */
export function cellsInside(box: CellBox, cells: ReadonlyMap<string, StoredCell>): string[] {
  if (boxSize(box) <= cells.size) return cellsOf(box).filter((reference) => cells.has(reference));
  return [...cells.keys()].filter((reference) => {
    const { row, column } = cellPlace(reference);
    return row >= box.top && row <= box.bottom && column >= box.left && column <= box.right;
  });
}
