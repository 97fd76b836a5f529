import { readFileSync } from "node:fs";
import { cellFunctionFiles } from "../../src/record/cell-function-files";
import { generatedText } from "../../src/record/generated-text";
import { nameFaults } from "../../src/record/name-faults";
import { readComments } from "../../src/record/read-comments";
import { withFunctionTable } from "../../src/record/readme-table";
import type { CatalogueEntry } from "../../src/cells/catalogue-entry";

const made = generatedText(cellFunctionFiles(process.cwd()));

test("every cell function's comment names purpose, units, range, source and example", () => {
  expect(made.faults).toEqual([]);
  expect(made.entries.length).toBeGreaterThan(0);
});

test("the generated files are those the comments give", () => {
  expect(readFileSync("src/cells/generated/catalogue.ts", "utf8")).toBe(made.catalogueText);
  expect(readFileSync("src/cells/generated/functions.ts", "utf8")).toBe(made.functionsText);
});

test("the README's function table is the one the comments give", () => {
  const readme = readFileSync("README.md", "utf8");
  expect(withFunctionTable(readme, made.entries)).toBe(readme);
});

const COMPLETE = `/**
 * Doubles a number.
 * @customfunction DOUBLE_IT
 * @param {any} value A number.
 * @returns {number} Twice the value.
 * @family Sheet
 * @unit value 1
 * @unit result 1
 * @limits Any finite number.
 * @source Arithmetic.
 * @example =WALL.DOUBLE_IT(2) → 4
 */
export function doubleIt(value: any): number { return 2 * value; }`;

test("a complete comment has no fault", () => {
  const { functions, faults } = readComments("double-it.ts", COMPLETE);
  expect(faults).toEqual([]);
  expect(functions[0]!.entry.examples).toEqual([{ formula: "=WALL.DOUBLE_IT(2)", value: 4 }]);
});

test.each([
  ["@unit value 1", "gives no unit for its argument value"],
  ["@unit result 1", "gives no unit for its result"],
  ["@limits Any finite number.", "has no @limits"],
  ["@source Arithmetic.", "has no @source"],
  ["@example =WALL.DOUBLE_IT(2) → 4", "has no @example"],
  ["@family Sheet", "has no @family"],
  ["@returns {number} Twice the value.", "does not say what it gives"],
  ["Doubles a number.", "has no purpose sentence"],
  ["@param {any} value A number.", "does not describe its argument value"],
])("a comment without “%s” is a fault", (line, fault) => {
  const { faults } = readComments("double-it.ts", COMPLETE.replace(` * ${line}\n`, ""));
  expect(faults.join("\n")).toContain(fault);
});

test("an example without a value is a fault", () => {
  expect(readComments("x.ts", COMPLETE.replace("→ 4", "→ four")).faults.join()).toContain("example without a value");
});

const named = (name: string): CatalogueEntry => ({
  name, family: "Sheet", purpose: "p", parameters: [], gives: "g", resultUnit: "1", limits: [], sources: [], examples: [], words: [],
});

test.each([
  ["H12", "reads as a cell reference"],
  ["R1C1", "reads as a cell reference"],
  ["UE", "shorter than 3"],
  ["mass_defect", "not capitals"],
])("the name %s is refused", (name, fault) => {
  expect(nameFaults([named(name)]).join()).toContain(fault);
});

test("a name declared twice is refused", () => {
  expect(nameFaults([named("TWICE_SAID"), named("TWICE_SAID")]).join()).toContain("declared twice");
});
