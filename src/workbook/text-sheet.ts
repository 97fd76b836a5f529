import { cellName } from "./cell-reference";
import { xmlText } from "./xml-text";

/** Characters a cell can hold (Excel's limit). */
const LONGEST_TEXT = 32_767;

/**
 * A worksheet part of text: every cell is stored as inline text, so that nothing in it can be taken for a formula, and neither the
 * shared texts nor the styles of the book change. The first `frozenRows` rows stay in view.
 */
export function textSheet(namespace: string, rows: readonly (readonly string[])[], widths: readonly number[], frozenRows: number): string {
  const cols = widths.map((width, i) => `<col min="${i + 1}" max="${i + 1}" width="${width}" customWidth="1"/>`).join("");
  const pane = frozenRows > 0 ? `<pane ySplit="${frozenRows}" topLeftCell="A${frozenRows + 1}" activePane="bottomLeft" state="frozen"/>` : "";
  const data = rows.map((row, r) => `<row r="${r + 1}">${row.map((text, c) => (text === "" ? "" : textCell(cellName(c + 1, r + 1), text))).join("")}</row>`).join("");
  return `<?xml version="1.0" encoding="UTF-8" standalone="yes"?>\n<worksheet xmlns="${namespace}"><sheetViews><sheetView workbookViewId="0">${pane}</sheetView></sheetViews><cols>${cols}</cols><sheetData>${data}</sheetData></worksheet>`;
}

function textCell(reference: string, text: string): string {
  const held = text.length > LONGEST_TEXT ? text.slice(0, LONGEST_TEXT - 1) + "…" : text;
  return `<c r="${reference}" t="inlineStr"><is><t xml:space="preserve">${xmlText(held)}</t></is></c>`;
}
