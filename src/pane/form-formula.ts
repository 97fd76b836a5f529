import type { CatalogueEntry } from "../cells/catalogue-entry";

/** The namespace the functions carry in cells. */
const NAMESPACE = "WALL";

/** `WALL.NAME(x, ue, nu, [options])`: how a function is called, for reading. */
export function callPattern(entry: CatalogueEntry): string {
  return `${NAMESPACE}.${entry.name}(${entry.parameters.map((p) => (p.optional ? `[${p.name}]` : p.name)).join(", ")})`;
}

/** A formula ready to be written, or the arguments it still needs. */
export type FormedFormula = { readonly formula: string; readonly missing: readonly [] } | { readonly formula?: undefined; readonly missing: readonly string[] };

/** The call with the written arguments, one per parameter; empty optional ones at the end are left out. */
export function formFormula(entry: CatalogueEntry, written: readonly string[]): FormedFormula {
  const values = entry.parameters.map((_, i) => (written[i] ?? "").trim());
  const missing = entry.parameters.filter((p, i) => !p.optional && values[i] === "").map((p) => p.name);
  if (missing.length > 0) return { missing };
  while (values.length > 0 && values.at(-1) === "") values.pop();
  return { formula: `=${NAMESPACE}.${entry.name}(${values.join(",")})`, missing: [] };
}

/** The arguments of the call of this very function inside its first example, one per parameter; all empty if there is none. */
export function exampleArguments(entry: CatalogueEntry): string[] {
  const blank = entry.parameters.map(() => "");
  for (const { formula } of entry.examples) {
    const found = callArguments(formula, `${NAMESPACE}.${entry.name}`);
    if (found && found.length <= entry.parameters.length) return blank.map((_, i) => found[i] ?? "");
  }
  return blank;
}

/** Names (without namespace, upper case) of the WALL functions a formula calls, in order, each once. */
export function calledFunctions(formula: string): string[] {
  const names = new Set<string>();
  for (const match of withoutStrings(formula).matchAll(/\bWALL\.([A-Z0-9_]+)\s*\(/gi)) names.add(match[1]!.toUpperCase());
  return [...names];
}

/** The arguments of the first call of `name` (with its namespace) in a formula, as written; undefined where it is not called. */
export function callArguments(formula: string, name: string): string[] | undefined {
  const at = withoutStrings(formula).toUpperCase().indexOf(name + "(");
  if (at < 0) return undefined;
  const found: string[] = [];
  let depth = 0;
  let quoted = false;
  let start = at + name.length + 1;
  for (let i = start; i < formula.length; i++) {
    const c = formula[i]!;
    if (c === '"') quoted = !quoted;
    if (quoted) continue;
    if (c === "(" || c === "{") depth++;
    else if ((c === "," && depth === 0) || (c === ")" && depth === 0)) {
      found.push(formula.slice(start, i).trim());
      start = i + 1;
      if (c === ")") return found;
    } else if (c === ")" || c === "}") depth--;
  }
  return undefined;
}

/** Same length, string contents blanked out. */
function withoutStrings(formula: string): string {
  return formula.replace(/"[^"]*"/g, (text) => `"${" ".repeat(text.length - 2)}"`);
}
