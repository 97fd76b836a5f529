import { tokenize, tokenTypes, type Token } from "@borgar/fx";
import { catalogue } from "../cells/generated/catalogue";
import { sheetRows } from "../engine/engine-values";
import type { EngineModel } from "../engine/types";
import { isWallCall, wallFunctionName } from "../workbook/wall-call";

/** Functions that march an edge-speed column: their first arguments are x, ue, nu. */
const MARCHES = new Set(catalogue.filter((e) => e.name !== "INPUT_CHECK" && e.parameters.slice(0, 3).map((p) => p.name).join() === "x,ue,nu").map((e) => e.name));
const CHECK = "WALL.INPUT_CHECK";

/**
 * What INPUT_CHECK finds amiss in the x, ue and nu of every march that a formula (as the engine holds it, with "=") calls; nothing
 * where it finds them usable. Arguments that are names of a LET cannot be checked on their own, and it says so.
 */
export function inputFindings(model: EngineModel, sheetId: string, formula: string): string[] {
  const tokens = tokenize(formula, { withLocation: false });
  const found = tokens.flatMap((token, i) => {
    const name = token.type === tokenTypes.FUNCTION && isWallCall(token.value.toUpperCase()) ? wallFunctionName(token.value.toUpperCase()) : "";
    if (!MARCHES.has(name)) return [];
    const given = argumentTexts(tokens, i + 1).slice(0, 3);
    if (given.length < 3) return [];
    const result = model.getters.evaluateFormulaResult(sheetId, `=${CHECK}(${given.join(",")})`);
    if (!Array.isArray(result)) return [`the inputs of ${name} could not be checked on their own`];
    const [, verdict, ...findings] = sheetRows(result).map((row) => row.map(String));
    if (verdict?.[1] === "usable") return [];
    if (given.some((text) => hasLocalName(text))) return [`the inputs of ${name} could not be checked on their own`];
    const amiss = findings.filter(([check, , advice]) => advice !== "" || check === "edge curve");
    return amiss.map(([check, finding, advice]) => `${check}: ${finding}${advice === "" ? "" : ` (${advice})`}`);
  });
  return [...new Set(found)];
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
