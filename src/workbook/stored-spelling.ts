import { tokenize, tokenTypes, type Token } from "@borgar/fx";

/** Functions younger than the file format, which a file must spell with `_xlfn.`; those marked * with `_xlfn._xlws.`. From Microsoft's list "Issue: an _xlfn. prefix is displayed" (from memory). */
const FUTURE = new Set(
  "ACOT ACOTH AGGREGATE ARABIC BASE BETA.DIST BETA.INV BINOM.DIST BINOM.DIST.RANGE BINOM.INV BITAND BITLSHIFT BITOR BITRSHIFT BITXOR BYCOL BYROW CEILING.MATH CHISQ.DIST CHISQ.DIST.RT CHISQ.INV CHISQ.INV.RT CHISQ.TEST CHOOSECOLS CHOOSEROWS COMBINA CONCAT CONFIDENCE.NORM CONFIDENCE.T COT COTH COVARIANCE.P COVARIANCE.S CSC CSCH DAYS DECIMAL DROP ERF.PRECISE ERFC.PRECISE EXPAND EXPON.DIST F.DIST F.DIST.RT F.INV F.INV.RT F.TEST FILTERXML FLOOR.MATH FORECAST.LINEAR FORMULATEXT GAMMA GAMMA.DIST GAMMA.INV GAMMALN.PRECISE GAUSS HSTACK HYPGEOM.DIST IFNA IFS IMCOSH IMSINH ISFORMULA ISOMITTED ISOWEEKNUM LAMBDA LET LOGNORM.DIST LOGNORM.INV MAKEARRAY MAP MAXIFS MINIFS MODE.MULT MODE.SNGL MUNIT NEGBINOM.DIST NORM.DIST NORM.INV NORM.S.DIST NORM.S.INV NUMBERVALUE PERCENTILE.EXC PERCENTILE.INC PERCENTRANK.EXC PERCENTRANK.INC PERMUTATIONA PHI POISSON.DIST QUARTILE.EXC QUARTILE.INC RANDARRAY RANK.AVG RANK.EQ REDUCE SCAN SEC SECH SEQUENCE SHEET SHEETS SINGLE SKEW.P SORTBY STDEV.P STDEV.S SWITCH T.DIST T.DIST.2T T.DIST.RT T.INV T.INV.2T T.TEST TAKE TEXTAFTER TEXTBEFORE TEXTJOIN TEXTSPLIT TOCOL TOROW UNICHAR UNICODE UNIQUE VAR.P VAR.S VSTACK WEIBULL.DIST WRAPCOLS WRAPROWS XLOOKUP XMATCH XOR Z.TEST".split(
    " ",
  ),
);
const SHEET_FUTURE = new Set(["FILTER", "SORT"]);

/** A plain formula (`=LET(a,1,a+WALL.X(D5#))`) as a file stores it, without "=": prefixed functions, parameters, add-in calls and spills. */
export function storedSpelling(formula: string, functionNames: readonly string[]): string {
  const own = new Map(functionNames.map((n) => [n.toUpperCase(), `_xldudf_${n.replace(/\./g, "_")}`]));
  const tokens = singles(tokenize(formula, { withLocation: false }));
  const parameters = parameterNames(tokens);
  const out: string[] = [];
  tokens.forEach((token, i) => {
    const upper = token.value.toUpperCase();
    if (token.type === tokenTypes.FX_PREFIX) return;
    if (isOperator(token, "#") && i > 0) {
      out.push(`_xlfn.ANCHORARRAY(${out.pop()!})`);
    } else if (token.type === tokenTypes.REF_NAMED && parameters.has(upper)) out.push("_xlpm." + token.value);
    else if (token.type === tokenTypes.FUNCTION) {
      if (parameters.has(upper)) out.push("_xlpm." + token.value);
      else out.push(own.get(upper) ?? (SHEET_FUTURE.has(upper) ? "_xlfn._xlws." + upper : FUTURE.has(upper) ? "_xlfn." + upper : token.value));
    } else out.push(token.value);
  });
  return out.join("");
}

/** A stored formula as a sheet shows it: the inverse of `storedSpelling`. */
export function shownSpelling(stored: string, functionNames: readonly string[]): string {
  const own = new Map(functionNames.flatMap((n) => [`_xldudf_${n.replace(/\./g, "_")}`, n].map((spelling) => [spelling.toUpperCase(), n] as const)));
  const tokens = tokenize("=" + stored, { withLocation: false }).map((t) => ({ ...t }));
  for (let i = 0; i < tokens.length; i++) {
    const token = tokens[i]!;
    if (token.type !== tokenTypes.FUNCTION && token.type !== tokenTypes.REF_NAMED) continue;
    const marked = /^_xlfn\.(ANCHORARRAY|SINGLE)$/i.exec(token.value)?.[1]?.toUpperCase();
    const close = marked === undefined ? -1 : closing(tokens, i + 1);
    if (close > 0) {
      const inside = tokens.slice(i + 2, close);
      tokens.splice(i, close - i + 1, ...(marked === "SINGLE" ? [operator("@"), ...inside] : [...inside, operator("#")]));
      continue;
    }
    const bare = token.value.replace(/^(?:_xlfn\.|_xlws\.|_xlpm\.)+/i, "");
    token.value = own.get(bare.toUpperCase()) ?? bare;
  }
  return tokens.map((t) => t.value).join("");
}

/** `@x` → `SINGLE(x)`, the innermost first; what follows the sign is a reference, a name, a call or a bracketed expression. */
function singles(written: readonly Token[]): Token[] {
  const tokens = written.map((t) => ({ ...t }));
  for (let i = tokens.length - 1; i >= 0; i--) {
    if (!isOperator(tokens[i]!, "@")) continue;
    let end = i + 1;
    if (tokens[end]?.type === tokenTypes.FUNCTION) end = closing(tokens, end + 1);
    else if (tokens[end]?.value === "(") end = closing(tokens, end);
    if (end < 0 || end >= tokens.length) continue;
    if (tokens[end + 1] && isOperator(tokens[end + 1]!, "#")) end++;
    tokens.splice(i, end - i + 1, { type: tokenTypes.FUNCTION, value: "SINGLE" }, operator("("), ...tokens.slice(i + 1, end + 1), operator(")"));
  }
  return tokens;
}

function operator(value: string): Token {
  return { type: tokenTypes.OPERATOR, value };
}

function isOperator(token: Token, value: string): boolean {
  return token.type === tokenTypes.OPERATOR && token.value === value;
}

/** Names that LET and LAMBDA give in this formula, upper case. */
function parameterNames(tokens: readonly Token[]): Set<string> {
  const names = new Set<string>();
  tokens.forEach((token, i) => {
    const upper = token.value.toUpperCase();
    if (token.type !== tokenTypes.FUNCTION || (upper !== "LET" && upper !== "LAMBDA")) return;
    const close = closing(tokens, i + 1);
    let depth = 0;
    let argument = 0;
    for (let j = i + 1; j < close; j++) {
      const { value, type } = tokens[j]!;
      if (value === "(" || value === "{") depth++;
      else if (value === ")" || value === "}") depth--;
      else if (value === "," && depth === 1) argument++;
      else if (depth === 1 && type === tokenTypes.REF_NAMED && (upper === "LAMBDA" || argument % 2 === 0) && nextSolid(tokens, j) === ",") names.add(value.toUpperCase());
    }
  });
  return names;
}

function nextSolid(tokens: readonly Token[], from: number): string | undefined {
  for (let i = from + 1; i < tokens.length; i++) if (tokens[i]!.type !== tokenTypes.WHITESPACE) return tokens[i]!.value;
  return undefined;
}

/** Index of the bracket that closes the one at `open`, or -1. */
function closing(tokens: readonly Token[], open: number): number {
  let depth = 0;
  for (let i = open; i < tokens.length; i++) {
    if (tokens[i]!.value === "(") depth++;
    else if (tokens[i]!.value === ")" && --depth === 0) return i;
  }
  return -1;
}
