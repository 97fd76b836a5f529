import type { CellBlock } from "./cell-block";
import type { HostCell } from "./sheet-host";

/** Fewer numbers than this are not taken for a column of data. */
const SHORTEST_COLUMN = 2;

/**
 * The columns of numbers in a selection, from left to right: headings above and blanks below are left off. A column with
 * anything else below its first number is still taken, so that the function's own sentence can name the bad row.
 */
export function selectedColumns(selection: CellBlock, cells: readonly (readonly HostCell[])[]): CellBlock[] {
  const columns: CellBlock[] = [];
  for (let c = 0; c < (cells[0]?.length ?? 0); c++) {
    const isNumber = cells.map((row) => typeof row[c]?.value === "number" && row[c]?.error === undefined);
    const first = isNumber.indexOf(true);
    if (isNumber.filter(Boolean).length < SHORTEST_COLUMN) continue;
    let last = cells.length - 1;
    while (last > first && isBlank(cells[last]![c])) last--;
    const column = selection.left + c;
    columns.push({ sheet: selection.sheet, left: column, right: column, top: selection.top + first, bottom: selection.top + last });
  }
  return columns;
}

/**
 * Where a formula goes when the selection holds data: the first column to the right of it that is blank in the selection's first
 * row and has a blank neighbour on its left. `rightOf` are the cells of that row, beginning next to the selection.
 */
export function placeBeside(selection: CellBlock, rightOf: readonly HostCell[]): CellBlock {
  let step = 1;
  while (step < rightOf.length && !(isBlank(rightOf[step]) && isBlank(rightOf[step - 1]))) step++;
  const column = selection.right + 1 + step;
  return { sheet: selection.sheet, left: column, right: column, top: selection.top, bottom: selection.top };
}

export function isBlank(cell: HostCell | undefined): boolean {
  return cell === undefined || ((cell.value === null || cell.value === "") && cell.error === undefined && cell.formula === undefined && cell.spilledFrom === undefined);
}
