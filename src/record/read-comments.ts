import ts from "typescript";
import type { CatalogueEntry, CatalogueExample, CatalogueParameter } from "../cells/catalogue-entry";

/** A cell function as found in one source file. */
export interface RecordedFunction {
  entry: CatalogueEntry;
  /** Name of the TypeScript function. */
  functionName: string;
}

/** What one file's comments say, and what they fail to say. */
export interface RecordedFile {
  functions: RecordedFunction[];
  faults: string[];
}

/**
 * Reads the comments above the cell functions of one file by the TypeScript compiler API. Tags of ours:
 * `@family`, `@unit <argument|result> <unit>`, `@limits`, `@source`, `@example <formula> → <value>`, `@words`.
 */
export function readComments(path: string, text: string): RecordedFile {
  const source = ts.createSourceFile(path, text, ts.ScriptTarget.ES2022, true);
  const functions: RecordedFunction[] = [];
  const faults: string[] = [];
  source.forEachChild((node) => {
    if (!ts.isFunctionDeclaration(node) || !node.name) return;
    const tags = ts.getJSDocTags(node);
    const tag = tags.find((t) => t.tagName.text === "customfunction");
    if (!tag) return;
    const name = textOf(tag.comment).trim();
    const fault = (what: string) => faults.push(`${path}: ${name || node.name!.text} ${what}`);
    const entry = entryOf(node, name, tags, fault);
    functions.push({ entry, functionName: node.name.text });
  });
  return { functions, faults };
}

function entryOf(node: ts.FunctionDeclaration, name: string, tags: readonly ts.JSDocTag[], fault: (what: string) => void): CatalogueEntry {
  const all = (tagName: string) => tags.filter((t) => t.tagName.text === tagName).map((t) => oneLine(textOf(t.comment)));
  const units = new Map<string, string>();
  for (const line of all("unit")) {
    const match = /^(\S+)\s+(.+)$/.exec(line);
    if (!match) fault(`has an @unit that names no unit: "${line}"`);
    else if (units.has(match[1]!)) fault(`states the unit of ${match[1]} twice`);
    else units.set(match[1]!, match[2]!);
  }
  const parameters: CatalogueParameter[] = [];
  const declared = node.parameters.filter((p) => p.type?.getText() !== "CustomFunctions.Invocation").map((p) => p.name.getText());
  const described = tags.filter(ts.isJSDocParameterTag);
  for (const parameter of declared) {
    const tag = described.find((t) => t.name.getText() === parameter);
    if (!tag) fault(`does not describe its argument ${parameter}`);
    if (!units.has(parameter)) fault(`gives no unit for its argument ${parameter}`);
    parameters.push({
      name: parameter,
      description: tag ? oneLine(textOf(tag.comment)) : "",
      unit: units.get(parameter) ?? "",
      optional: tag?.isBracketed ?? false,
    });
  }
  for (const named of units.keys()) if (named !== "result" && !declared.includes(named)) fault(`gives a unit for ${named}, which is no argument`);
  if (!units.has("result")) fault("gives no unit for its result");
  const returns = tags.find(ts.isJSDocReturnTag);
  if (!returns) fault("does not say what it gives (@returns)");
  const purpose = oneLine(textOf(docOf(node)?.comment));
  if (purpose === "") fault("has no purpose sentence");
  for (const needed of ["family", "limits", "source", "example"]) if (all(needed).length === 0) fault(`has no @${needed}`);
  return {
    name,
    family: all("family")[0] ?? "",
    purpose,
    parameters,
    gives: oneLine(textOf(returns?.comment)),
    resultUnit: units.get("result") ?? "",
    limits: all("limits"),
    sources: all("source"),
    examples: all("example").flatMap((line) => exampleOf(line, fault)),
    words: all("words").flatMap((line) => line.split(/\s+/)),
  };
}

function exampleOf(line: string, fault: (what: string) => void): CatalogueExample[] {
  const at = line.lastIndexOf("→");
  if (!line.startsWith("=") || at < 0) {
    fault(`has an example that is not "=formula → value": ${line}`);
    return [];
  }
  const written = line.slice(at + 1).trim();
  const formula = line.slice(0, at).trim();
  if (/^"[^]*"$/.test(written)) return [{ formula, value: written.slice(1, -1) }];
  if (/^(TRUE|FALSE)$/.test(written)) return [{ formula, value: written === "TRUE" }];
  const value = Number(written);
  if (!Number.isFinite(value) || written === "") {
    fault(`has an example without a value: ${line}`);
    return [];
  }
  return [{ formula, value }];
}

function docOf(node: ts.Node): ts.JSDoc | undefined {
  return ts.getJSDocCommentsAndTags(node).filter(ts.isJSDoc)[0];
}

function textOf(comment: string | ts.NodeArray<ts.JSDocComment> | undefined): string {
  return ts.getTextOfJSDocComment(comment) ?? "";
}

function oneLine(text: string): string {
  return text.replace(/\s+/g, " ").trim();
}
