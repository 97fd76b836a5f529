import { tokenize, tokenTypes, type Token } from "@borgar/fx";
import { catalogue } from "../cells/generated/catalogue";
import { sheetRows } from "../engine/engine-values";
import type { EngineMatrix, EngineModel, EngineValue } from "../engine/types";
import { isWallCall, wallFunctionName } from "../workbook/wall-call";

/** Functions that march an edge-speed column: their first arguments are x, ue, nu. */
const MARCHES = new Set(catalogue.filter((e) => e.name !== "INPUT_CHECK" && e.parameters.slice(0, 3).map((p) => p.name).join() === "x,ue,nu").map((e) => e.name));
const CHECK = "WALL.INPUT_CHECK";

/**
 * What INPUT_CHECK finds amiss in the x, ue and nu of every march that a formula (as the engine holds it, with "=") of a sheet calls; nothing
 * where it finds them usable. Arguments that are names of a LET cannot be checked on their own, and it says so.
 */
export function inputFindings(model: EngineModel): (sheetId: string, formula: string) => string[] {
  const known = new Map<string, readonly string[] | undefined>(); // many marches share their inputs
  const check = (sheetId: string, given: readonly string[]): readonly string[] | undefined => {
    const formula = `=${CHECK}(${given.join(",")})`;
    const key = `${sheetId}!${formula}`;
    if (!known.has(key)) known.set(key, findings(model.getters.evaluateFormulaResult(sheetId, formula), given));
    return known.get(key);
  };
  return (sheetId, formula) => {
    const tokens = tokenize(formula, { withLocation: false });
    const found = tokens.flatMap((token, i) => {
      const name = token.type === tokenTypes.FUNCTION && isWallCall(token.value.toUpperCase()) ? wallFunctionName(token.value.toUpperCase()) : "";
      const given = MARCHES.has(name) ? argumentTexts(tokens, i + 1).slice(0, 3) : [];
      if (given.length < 3) return [];
      return check(sheetId, given) ?? [`the inputs of ${name} could not be checked on their own`];
    });
    return [...new Set(found)];
  };
}

/** Undefined where the check says nothing about the inputs of the march. */
function findings(result: EngineValue | EngineMatrix, given: readonly string[]): string[] | undefined {
  if (!Array.isArray(result)) return undefined;
  const [, verdict, ...rows] = sheetRows(result).map((row) => row.map(String));
  if (verdict?.[1] === "usable") return [];
  if (given.some(hasLocalName)) return undefined;
  const amiss = rows.filter(([what, , advice]) => advice !== "" || what === "edge curve");
  return amiss.map(([what, finding, advice]) => `${what}: ${finding}${advice === "" ? "" : ` (${advice})`}`);
}

/** The arguments' texts of the call whose opening bracket stands at `open`. */
function argumentTexts(tokens: readonly Token[], open: number): string[] {
  const texts = [""];
  let depth = 0;
  for (let i = open; i < tokens.length; i++) {
    const { value } = tokens[i]!;
    const opens = value === "(" || value === "{";
    const closes = value === ")" || value === "}";
    if (opens && depth++ === 0) continue;
    if (closes && --depth === 0) return texts.map((t) => t.trim());
    if (value === "," && depth === 1) texts.push("");
    else texts[texts.length - 1] += value;
  }
  return [];
}

/** Names left in the engine's formula are parameters: those of the book stand there as what they mean. */
function hasLocalName(text: string): boolean {
  return tokenize(`=${text}`, { withLocation: false }).some((t) => t.type === tokenTypes.REF_NAMED);
}
