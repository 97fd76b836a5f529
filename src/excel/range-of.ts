import { blockAddress, type CellBlock } from "../pane/cell-block";

/** Range of a block in a batch. */
export function rangeOf(context: Excel.RequestContext, block: CellBlock): Excel.Range {
  return context.workbook.worksheets.getItem(block.sheet).getRange(blockAddress(block, block.sheet));
}
