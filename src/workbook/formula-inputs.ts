import { isRange, tokenize, tokenTypes } from "@borgar/fx";
import { cellPlace } from "./cell-reference";
import { withoutBrokenBook, type formulaReader } from "./plain-formula";

/**
 * The addresses a stored formula (without "=") reads, each once, in its order: `Wing!A4:A18`, `edge_speeds = Wing!B4:B18`,
 * `Runs[speed] = Runs!B4:B6`, `D3# = Wing!D3:G18` where the spill's block is known.
 */
export function formulaInputs(formula: string, sheet: string, at: string, read: ReturnType<typeof formulaReader>, spillOf: (sheet: string, cell: string) => string | undefined): string[] {
  const place = cellPlace(at);
  const tokens = tokenize("=" + withoutBrokenBook(formula), { withLocation: false });
  const found = tokens.flatMap((token, i): string[] => {
    if (isRange(token) && token.type !== tokenTypes.REF_STRUCT) {
      const full = withSheet(token.value, sheet);
      const isSpill = tokens[i - 1]?.value === "(" && /^(?:_xlfn\.)?ANCHORARRAY$/i.test(tokens[i - 2]?.value ?? "");
      if (!isSpill) return [full];
      const cut = full.lastIndexOf("!");
      const block = spillOf(unquoted(full.slice(0, cut)), full.slice(cut + 1));
      return [`${plain(token.value)}#${block === undefined ? "" : ` = ${full.slice(0, cut)}!${block}`}`];
    }
    if (token.type !== tokenTypes.REF_NAMED && token.type !== tokenTypes.REF_STRUCT) return [];
    const stands = read(token.value, sheet, place).text.slice(1);
    if (stands === token.value) return []; // a parameter of LET or LAMBDA, or a name the book does not define
    return [`${token.value} = ${isRange(tokenize(stands, { withLocation: false })[0]!) ? withSheet(stands, sheet) : stands}`];
  });
  return [...new Set(found)];
}

function withSheet(reference: string, sheet: string): string {
  return reference.includes("!") ? plain(reference) : `${/^[\p{L}_][\p{L}\p{N}_.]*$/u.test(sheet) ? sheet : `'${sheet.replace(/'/g, "''")}'`}!${plain(reference)}`;
}

/** Without the `$` signs of the cells, which matter only for copying. */
function plain(reference: string): string {
  const cut = reference.lastIndexOf("!") + 1;
  return reference.slice(0, cut) + reference.slice(cut).replace(/\$/g, "");
}

function unquoted(sheet: string): string {
  return sheet.replace(/^'|'$/g, "").replace(/''/g, "'");
}
