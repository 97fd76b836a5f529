import { sharedFormulaAt } from "./plain-formula";
import type { StoredCell } from "./read-sheet";

/** The stored formula of every formula cell, without "="; a shared formula moved to each of its cells. What-if tables have none. */
export function cellFormulas(cells: ReadonlyMap<string, StoredCell>): Map<string, string> {
  const shared = new Map<string, StoredCell>();
  for (const cell of cells.values()) if (cell.formula?.kind === "shared" && cell.formula.text !== "") shared.set(cell.formula.shared ?? "", cell);
  const found = new Map<string, string>();
  for (const cell of cells.values()) {
    const text = cell.formula && formulaOf(cell, shared);
    if (text) found.set(cell.reference, text);
  }
  return found;
}

function formulaOf(cell: StoredCell, shared: ReadonlyMap<string, StoredCell>): string | undefined {
  const { formula } = cell;
  if (!formula || formula.kind === "dataTable") return undefined;
  if (formula.kind !== "shared" || formula.text !== "") return formula.text;
  const master = shared.get(formula.shared ?? "");
  return master?.formula && sharedFormulaAt(master.formula.text, master.reference, cell.reference);
}
