import { readAddress } from "../pane/cell-block";
import type { WallCell } from "../pane/sheet-host";

const CALLS_WALL = /(^|[^A-Z0-9_.])WALL\.[A-Z]/i;

/** Every cell of the book whose formula calls a WALL function: three round trips, however many there are. */
export async function wallCellsOf(context: Excel.RequestContext): Promise<WallCell[]> {
  const sheets = context.workbook.worksheets;
  sheets.load("items/name");
  await context.sync();
  const parts = sheets.items.map((sheet) => ({ sheet, used: sheet.getUsedRangeOrNullObject(true) }));
  for (const { used } of parts) used.load("address, formulas, values, valueTypes");
  await context.sync();
  const found = parts.flatMap(({ sheet, used }) => {
    const block = used.isNullObject ? undefined : readAddress(used.address, sheet.name);
    if (!block) return [];
    return used.formulas.flatMap((row, r) =>
      row.flatMap((formula: unknown, c: number) => {
        if (typeof formula !== "string" || !formula.startsWith("=") || !CALLS_WALL.test(formula.replace(/"[^"]*"/g, '""'))) return [];
        const cell = sheet.getCell(block.top + r, block.left + c);
        const spill = cell.getSpillingToRangeOrNullObject();
        spill.load("address");
        const at = { sheet: sheet.name, left: block.left + c, right: block.left + c, top: block.top + r, bottom: block.top + r };
        return [{ at, formula, spill, value: used.values[r]![c] as unknown, type: used.valueTypes[r]![c]! }];
      }),
    );
  });
  if (found.length > 0) await context.sync();
  return found
    // A spilled cell repeats its parent's formula in `formulas`; only a parent or a single result is a WALL cell of its own.
    .filter(({ at, formula }, i) => !found.some((other, j) => j !== i && other.formula === formula && covers(other, at)))
    .map(({ at, formula, spill, value, type }) => ({
      at,
      formula,
      spill: (spill.isNullObject ? undefined : readAddress(spill.address, at.sheet)) ?? at,
      ...(type === "Error" ? { error: { code: String(value), sentence: "" } } : {}),
    }));
}

function covers(source: { spill: Excel.Range; at: WallCell["at"] }, at: WallCell["at"]): boolean {
  const block = source.spill.isNullObject ? undefined : readAddress(source.spill.address, source.at.sheet);
  if (!block || block.sheet !== at.sheet) return false;
  return at.left >= block.left && at.left <= block.right && at.top >= block.top && at.top <= block.bottom;
}
