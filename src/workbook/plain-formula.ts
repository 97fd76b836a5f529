import { isRange, parseStructRef, tokenize, tokenTypes, translateFormulaToA1, translateFormulaToR1C1, type Token } from "@borgar/fx";
import { boxName, cellBox, cellName, type CellBox, type CellPlace } from "./cell-reference";
import type { BookTable, Workbook } from "./read-workbook";

/** Names may refer to names; a formula that needs more of them than this was made to exhaust the reader. */
const MOST_NAMES = 1_000;

/** A formula as a sheet would show it, names and table references replaced by what they stand for. */
export interface PlainFormula {
  text: string;
  /** Functions it calls, without stored prefixes, upper case. */
  functions: string[];
  /** It refers to another book, whose values are not here. */
  outside: boolean;
  /** A name it uses that the book does not define, or defines by itself. */
  missingName?: string;
}

/** Turns stored formulas of one workbook into plain ones: `_xlfn.` and add-in prefixes stay (the sheet engine knows them). */
export function formulaReader(book: Pick<Workbook, "names" | "tables">, sheetAlias: (name: string) => string = (name) => name) {
  const names = new Map(book.names.map((n) => [`${n.sheet?.toUpperCase() ?? ""}!${n.name.toUpperCase()}`, n.text.replace(/^=/, "")]));
  const tables = new Map(book.tables.map((t) => [t.name.toUpperCase(), t]));
  let namesRead = 0;

  function read(text: string, sheet: string, at: CellPlace, chain: readonly string[]): PlainFormula {
    const tokens = tokenize(withoutBrokenBook(text), { withLocation: false }).map(ownSpelling);
    const local = new Set(tokens.filter((t) => /^_xlpm\./i.test(t.value)).map((t) => t.value.slice(6).toUpperCase()));
    const functions: string[] = [];
    let outside = false;
    let missingName: string | undefined;
    // Writers that leave out `_xlpm.` give parameters plain names.
    const hasParameters = tokens.some((t) => t.type === tokenTypes.FUNCTION && /^(?:LET|LAMBDA)$/.test(bareFunction(t.value)));
    const parts = tokens.map((token, i): string => {
      switch (token.type) {
        case tokenTypes.FUNCTION: {
          // A name that holds a LAMBDA is called like a function; any other name gives way to the function of that name.
          const found = named(token.value, sheet, at, chain, local);
          const called = found?.functions.includes("LAMBDA") || found?.missingName === token.value ? found : undefined;
          if (called === undefined) functions.push(bareFunction(token.value));
          else {
            functions.push(...called.functions);
            outside ||= called.outside;
            missingName ??= called.missingName;
          }
          return called?.text ?? token.value;
        }
        case tokenTypes.REF_STRUCT:
          return structured(token.value, sheet, at);
        case tokenTypes.REF_NAMED: {
          const inlined = named(token.value, sheet, at, chain, local);
          if (inlined === undefined) {
            const table = local.has(token.value.toUpperCase()) ? undefined : tables.get(token.value.toUpperCase());
            if (table) return structured(`${table.name}[]`, sheet, at);
            if (!hasParameters && !/^_xl(?:pm|eta)\./i.test(token.value)) missingName ??= token.value;
            return token.value;
          }
          functions.push(...inlined.functions);
          outside ||= inlined.outside;
          missingName ??= inlined.missingName;
          return inlined.text;
        }
        default:
          if (token.value === "!" && tokens[i - 1]?.value === "]") outside = true;
          if (!isRange(token)) return token.value;
          // `#REF!A1`: a cell of a sheet that is gone.
          if (tokens[i - 1]?.value === "#REF!") return "";
          if (/^'?\[/.test(token.value)) outside = true;
          return aliased(token);
      }
    });
    return { text: parts.join(""), functions: functions.filter((f) => !local.has(f)), outside, ...(missingName === undefined ? {} : { missingName }) };
  }

  function named(value: string, sheet: string, at: CellPlace, chain: readonly string[], local: ReadonlySet<string>): PlainFormula | undefined {
    const mark = value.lastIndexOf("!");
    const name = value.slice(mark + 1).toUpperCase();
    if (name.startsWith("_XLPM.") || (mark < 0 && local.has(name))) return undefined;
    const scope = mark < 0 ? sheet : value.slice(0, mark).replace(/^'|'$/g, "").replace(/''/g, "'");
    const text = names.get(`${scope.toUpperCase()}!${name}`) ?? names.get(`!${name}`);
    if (text === undefined) return undefined;
    if (chain.includes(`${scope}!${name}`) || ++namesRead > MOST_NAMES) return { text: "#NAME?", functions: [], outside: false, missingName: value };
    const here = cellName(at.column, at.row);
    const moved = translateFormulaToA1(translateFormulaToR1C1("=" + text, "A1"), here).slice(1);
    const inner = read(moved, scope, at, [...chain, `${scope}!${name}`]);
    const onlyRange = tokenize(moved).filter((t) => t.type !== tokenTypes.WHITESPACE).length === 1 && isRange(tokenize(moved).find((t) => t.type !== tokenTypes.WHITESPACE)!);
    return onlyRange ? inner : { ...inner, text: `(${inner.text})` };
  }

  function structured(value: string, sheet: string, at: CellPlace): string {
    const reference = parseStructRef(value);
    const table = reference?.table ? tables.get(reference.table.toUpperCase()) : [...tables.values()].find((t) => t.sheet === sheet && holds(cellBox(t.ref), at));
    if (!reference || !table) return "#REF!";
    const box = tablePart(table, reference.columns ?? [], reference.sections ?? [], at);
    if (box === "#VALUE!") return box;
    return box ? `${quoted(sheetAlias(table.sheet))}!${absolute(box)}` : "#REF!";
  }

  function aliased(token: Token): string {
    const mark = token.value.lastIndexOf("!");
    if (mark < 0) return token.value;
    const written = token.value.slice(0, mark);
    const name = written.replace(/^'|'$/g, "").replace(/''/g, "'");
    const alias = sheetAlias(name);
    return alias === name ? token.value : `${quoted(alias)}${token.value.slice(mark)}`;
  }

  /** Reads one formula of a cell; `text` is what stands in its `<f>`, without "=". */
  return (text: string, sheet: string, at: CellPlace): PlainFormula => {
    namesRead = 0;
    const plain = read("=" + text, sheet, at, []);
    return { ...plain, text: plain.text.startsWith("=") ? plain.text : "=" + plain.text };
  };
}

/** A shared formula's text at another cell of its block. */
export function sharedFormulaAt(text: string, from: string, to: string): string {
  return translateFormulaToA1(translateFormulaToR1C1("=" + text, from), to).slice(1);
}

/** `_xlfn._xlws.SORT` → SORT; `_xldudf_WALL_X` and `WALL.X` stay apart until the engine reads them. */
function bareFunction(name: string): string {
  return name.replace(/^(?:_xlfn\.|_xlws\.|_xlpm\.)+/i, "").toUpperCase();
}

/** Spellings of an add-in call in older files (`_xll.WALL.X`, `_xludf.WALL_X`, `WALL_X`), and `_xludf.` before a function of Excel's own: as newer files have them. */
function ownSpelling(token: Token): Token {
  if (token.type !== tokenTypes.FUNCTION) return token;
  const bare = token.value.replace(/^(?:_xlfn\.|_xll\.|_xludf\.)+/i, "");
  if (/^WALL_/i.test(bare)) return { ...token, value: `_xldudf_${bare}` };
  if (/^(?:WALL\.|_xldudf_)/i.test(bare) || /^(?:_xlfn\.)*_xludf\./i.test(token.value)) return { ...token, value: bare };
  return token;
}

/** A book whose add-in link broke stores `[1]!WALL.X(…)` or `'path\[book]'!WALL.X(…)`: the call itself is what was meant. `[0]!name` names this very book. */
export function withoutBrokenBook(text: string): string {
  return text.replace(/("(?:[^"]|"")*")|(?:\[\d+\]|'(?:[^']|'')*')!(?=(?:_xl[a-z]+[._])*WALL[._])|('(?:[^']|'')*')|\[0\]!/gi, (_whole, string?: string, quoted?: string) => string ?? quoted ?? "");
}

function tablePart(table: BookTable, columns: readonly string[], sections: readonly string[], at: CellPlace): CellBox | "#VALUE!" | undefined {
  const whole = cellBox(table.ref);
  let { left, right } = whole;
  if (columns.length > 0) {
    const places = columns.map((c) => table.columns.findIndex((known) => known.toUpperCase() === c.toUpperCase()));
    if (places.includes(-1)) return undefined;
    left = whole.left + places[0]!;
    right = whole.left + places.at(-1)!;
  }
  const dataTop = whole.top + (table.hasHeadings ? 1 : 0);
  const dataBottom = whole.bottom - (table.hasTotals ? 1 : 0);
  if (sections.some((s) => /^(?:this row|@)$/i.test(s)) && (at.row < dataTop || at.row > dataBottom)) return "#VALUE!";
  const rows: Record<string, [number, number] | undefined> = {
    data: [dataTop, dataBottom],
    all: [whole.top, whole.bottom],
    headers: table.hasHeadings ? [whole.top, whole.top] : undefined,
    totals: table.hasTotals ? [whole.bottom, whole.bottom] : undefined,
    "this row": [at.row, at.row],
    "@": [at.row, at.row],
  };
  const wanted = (sections.length === 0 ? ["data"] : sections).map((s) => rows[s.toLowerCase()]);
  const known = wanted.filter((w) => w !== undefined);
  if (known.length < wanted.length) return undefined;
  return { left, right, top: Math.min(...known.map((w) => w[0])), bottom: Math.max(...known.map((w) => w[1])) };
}

function holds(box: CellBox, at: CellPlace): boolean {
  return at.row >= box.top && at.row <= box.bottom && at.column >= box.left && at.column <= box.right;
}

function absolute(box: CellBox): string {
  return boxName(box).replace(/([A-Z]+)(\d+)/g, "$$$1$$$2");
}

function quoted(sheet: string): string {
  return `'${sheet.replace(/'/g, "''")}'`;
}
