import { readAddress, type CellBlock } from "../pane/cell-block";
import { calledFunctions } from "../pane/form-formula";
import type { WallCell } from "../pane/sheet-host";
import { rangeOf } from "./range-of";

/** The WALL cell at the block's first cell, or the one that spills over it: one round trip to find it, one to read it. */
export async function tableAt(context: Excel.RequestContext, block: CellBlock): Promise<WallCell | undefined> {
  const parent = rangeOf(context, { ...block, right: block.left, bottom: block.top }).getSpillParentOrNullObject();
  parent.load("address");
  await context.sync();
  const source = (parent.isNullObject ? undefined : readAddress(parent.address, block.sheet)) ?? block;
  const at = { ...source, right: source.left, bottom: source.top };
  const cell = rangeOf(context, at);
  cell.load("formulas, values, valueTypes");
  const spill = cell.getSpillingToRangeOrNullObject();
  spill.load("address");
  await context.sync();
  const formula: unknown = cell.formulas[0]![0];
  if (typeof formula !== "string" || !formula.startsWith("=") || calledFunctions(formula).length === 0) return undefined;
  return {
    at,
    formula,
    spill: (spill.isNullObject ? undefined : readAddress(spill.address, at.sheet)) ?? at,
    ...(String(cell.valueTypes[0]![0]) === "Error" ? { error: { code: String(cell.values[0]![0]), sentence: "" } } : {}),
  };
}
