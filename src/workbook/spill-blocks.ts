import { isRange, tokenize, tokenTypes, type Token } from "@borgar/fx";
import { cellBox, columnLetters, type CellBox } from "./cell-reference";

/** The block that a spill from a cell covers, if that cell's formula goes away; `sheet` as written before "!", undefined for the formula's own. */
export type BlockOf = (sheet: string | undefined, reference: string) => CellBox | undefined;

/** What a name alone stands for where that is one cell, such as `Wing!$D$3`. */
export type CellOfName = (name: string) => string | undefined;

/** A stored formula (without "=") with spill references such as `D3#` replaced by their blocks, `D3:G18`, where the block is known. */
export function spillBlocks(formula: string, blockOf: BlockOf, cellOfName: CellOfName = () => undefined): string {
  if (!/ANCHORARRAY\s*\(/i.test(formula)) return formula;
  const tokens = tokenize("=" + formula, { withLocation: false });
  const out: string[] = [];
  for (let i = 1; i < tokens.length; i++) {
    const block = replaced(tokens, i, blockOf, cellOfName);
    if (block === undefined) out.push(tokens[i]!.value);
    else {
      out.push(block);
      i += 3;
    }
  }
  return out.join("");
}

/** `ANCHORARRAY ( D3 )` from its function word → its block. */
function replaced(tokens: readonly Token[], at: number, blockOf: BlockOf, cellOfName: CellOfName): string | undefined {
  const [call, open, inside, close] = tokens.slice(at, at + 4);
  if (call?.type !== tokenTypes.FUNCTION || !/^(?:_xlfn\.)?ANCHORARRAY$/i.test(call.value)) return undefined;
  if (open?.value !== "(" || close?.value !== ")" || inside === undefined) return undefined;
  const written = isRange(inside) ? inside.value : inside.type === tokenTypes.REF_NAMED ? cellOfName(inside.value) : undefined;
  const parts = written === undefined ? null : /^(?:(.*)!)?(\$?)([A-Z]{1,3})(\$?)(\d+)$/i.exec(written);
  if (!parts) return undefined;
  const [, prefix, dollarColumn, column, dollarRow, row] = parts;
  const box = blockOf(prefix?.replace(/^'|'$/g, "").replace(/''/g, "'"), `${column!.toUpperCase()}${row!}`);
  if (!box) return undefined;
  const at0 = cellBox(`${column!}${row!}`);
  const last = { column: at0.left + box.right - box.left, row: at0.top + box.bottom - box.top };
  const end = last.column === at0.left && last.row === at0.top ? "" : `:${dollarColumn!}${columnLetters(last.column)}${dollarRow!}${last.row}`;
  return written! + end;
}
