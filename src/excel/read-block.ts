import { readAddress, type CellBlock } from "../pane/cell-block";
import type { HostCell, HostValue } from "../pane/sheet-host";
import { rangeOf } from "./range-of";

/** Reads a block, clipped to the sheet's used part; a single cell also tells which cell spilled it. */
export async function readBlock(context: Excel.RequestContext, block: CellBlock): Promise<HostCell[][]> {
  const used = context.workbook.worksheets.getItem(block.sheet).getUsedRangeOrNullObject(true);
  used.load("address");
  await context.sync();
  const filled = used.isNullObject ? undefined : readAddress(used.address, block.sheet);
  const right = Math.max(block.left, Math.min(block.right, filled?.right ?? block.left));
  const bottom = Math.max(block.top, Math.min(block.bottom, filled?.bottom ?? block.top));
  const range = rangeOf(context, { ...block, right, bottom });
  range.load("values, text, formulas, valueTypes");
  const single = right === block.left && bottom === block.top;
  const parent = single ? range.getSpillParentOrNullObject() : undefined;
  parent?.load("address");
  await context.sync();
  const source = parent === undefined || parent.isNullObject ? undefined : readAddress(parent.address, block.sheet);
  const spilledFrom = source && !(source.left === block.left && source.top === block.top) ? source : undefined;
  return range.values.map((row, r) =>
    row.map((value: unknown, c: number) => hostCell(value, range.text[r]![c]!, range.formulas[r]![c], range.valueTypes[r]![c]!, spilledFrom)),
  );
}

function hostCell(value: unknown, text: string, formula: unknown, type: string, spilledFrom: CellBlock | undefined): HostCell {
  const isError = type === "Error";
  return {
    value: type === "Empty" || value === "" ? null : (value as HostValue),
    text,
    // A spilled cell shows its parent's result and no formula of its own.
    ...(typeof formula === "string" && formula.startsWith("=") && spilledFrom === undefined ? { formula } : {}),
    // Office.js gives the code; the sentence stays in the cell's own error card.
    ...(isError ? { error: { code: String(value), sentence: "" } } : {}),
    ...(spilledFrom ? { spilledFrom } : {}),
  };
}
