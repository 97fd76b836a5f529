import { catalogue } from "../../src/cells/generated/catalogue";
import { evaluateFormula } from "../../src/engine/evaluate";
import { loadHeadless } from "../../src/engine/load-headless";
import { prepareEngine } from "../../src/engine/prepare-engine";
import { wallSheetFunctions } from "../../src/engine/wall-functions";

const engine = prepareEngine(loadHeadless(process.cwd()), wallSheetFunctions());
const examples = catalogue.flatMap((entry) => entry.examples.map((e) => [entry.name, e.formula, e.value] as const));

/** The value the comment prints, to the digits it prints. */
function asPrinted(got: unknown, printed: number | string | boolean): unknown {
  if (typeof got !== "number" || typeof printed !== "number" || printed === 0) return got;
  const digits = printed.toExponential().replace(/e.*$/, "").replace(/[-.]/g, "").length;
  return Number(got.toPrecision(Math.max(digits, 1)));
}

test.each(examples)("%s: %s gives what its comment says", (_name, formula, value) => {
  const got = evaluateFormula(engine, formula);
  const single = Array.isArray(got) && got.length === 1 && got[0].length === 1 ? got[0][0] : got;
  expect(asPrinted(single, value)).toBe(value);
});
