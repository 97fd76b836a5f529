import { isRange, tokenize, tokenTypes } from "@borgar/fx";
import { cellBox, type CellBox } from "./cell-reference";

/** What a plain formula reads. */
export interface ReferencesRead {
  /** Blocks by sheet; a whole column or row has its outermost ends. */
  blocks: { sheet: string; box: CellBox }[];
  /** It also reads cells that its text does not name: a spill, an INDIRECT, the end of a computed range. */
  more: boolean;
}

const LAST_COLUMN = 16_384;
const LAST_ROW = 1_048_576;
const COMPUTED = /^(?:_xlfn\.)?(?:INDIRECT|OFFSET|ANCHORARRAY)$/i;

/** Blocks a plain formula (names and tables already replaced) reads, seen from its sheet. */
export function referencesRead(formula: string, sheet: string): ReferencesRead {
  const blocks: ReferencesRead["blocks"] = [];
  let more = false;
  for (const token of tokenize(formula, { withLocation: false })) {
    if (token.type === tokenTypes.FUNCTION) more ||= COMPUTED.test(token.value);
    else if (token.type === tokenTypes.OPERATOR) more ||= token.value === "#" || token.value === ":";
    else if (token.type === tokenTypes.REF_NAMED || token.type === tokenTypes.UNKNOWN || token.type === tokenTypes.REF_STRUCT || token.type === tokenTypes.CONTEXT) more = true;
    else if (isRange(token)) {
      const mark = token.value.lastIndexOf("!");
      const named = mark < 0 ? sheet : token.value.slice(0, mark).replace(/^'|'$/g, "").replace(/''/g, "'");
      const box = boxOf(token.value.slice(mark + 1).replace(/\$/g, ""));
      if (box) blocks.push({ sheet: named, box });
      else more = true;
    }
  }
  return { blocks, more };
}

function boxOf(text: string): CellBox | undefined {
  if (/^[A-Z]{1,3}\d+(?::[A-Z]{1,3}\d+)?$/i.test(text)) return cellBox(text.toUpperCase());
  const columns = /^([A-Z]{1,3}):([A-Z]{1,3})$/i.exec(text);
  if (columns) return { ...cellBox(`${columns[1]!.toUpperCase()}1:${columns[2]!.toUpperCase()}1`), bottom: LAST_ROW };
  const rows = /^(\d+):(\d+)$/.exec(text);
  return rows ? { ...cellBox(`A${rows[1]!}:A${rows[2]!}`), right: LAST_COLUMN } : undefined;
}
