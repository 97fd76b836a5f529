import { readFileSync } from "node:fs";
import vm from "node:vm";
import Ajv from "ajv/dist/2020";
import { catalogue } from "../../src/cells/generated/catalogue";

// The files Excel loads, as built: `npm test` builds before it comes here.
const metadata = JSON.parse(readFileSync("dist/functions.json", "utf8")) as { allowErrorForDataTypeAny: boolean; functions: { id: string; helpUrl: string }[] };
const help = readFileSync("dist/help.html", "utf8");

/** Runs functions.js in a world that holds nothing but the stand-in for Excel's own object. */
function load(): Map<string, (...args: unknown[]) => unknown> {
  const associated = new Map<string, (...args: unknown[]) => unknown>();
  class ExcelError {
    constructor(
      readonly code: string,
      readonly message: string,
    ) {}
  }
  const CustomFunctions = {
    associate: (id: string, f: (...args: unknown[]) => unknown) => associated.set(id, f),
    Error: ExcelError,
    ErrorCode: { invalidValue: "#VALUE!", notAvailable: "#N/A" },
  };
  vm.runInNewContext(readFileSync("dist/functions.js", "utf8"), { CustomFunctions, self: {}, ExcelError });
  return associated;
}

test("functions.json is valid, asks for error cells, and leads each function to its place in the help", () => {
  const check = new Ajv({ allErrors: true }).compile(JSON.parse(readFileSync("test/references/schemas/functions.schema.json", "utf8")));
  check(metadata);
  expect(check.errors ?? []).toEqual([]);
  expect(metadata.allowErrorForDataTypeAny).toBe(true);
  for (const f of metadata.functions) {
    expect(f.helpUrl).toBe(`https://localhost:3000/help/${f.id}.html`);
    expect(help).toMatch(new RegExp(`id="?${f.id}"?`)); // the build drops quotes
    expect(readFileSync(`dist/help/${f.id}.html`, "utf8")).toContain(`<h1>${f.id}</h1>`);
  }
});

test("functions.js registers every function once, without a page or any other global", () => {
  expect([...load().keys()].sort()).toEqual(catalogue.map((e) => e.name).sort());
});

test("a function in the bundle calculates, and its refusals are errors of Excel's own kind with their sentence", () => {
  const functions = load();
  const none = { parameterAddresses: ["Sheet1!A1:A2"] };
  expect(functions.get("EDGE_SPEED")!([[1], [0]], 20, null, none)).toEqual([[0], [20]]);
  let thrown: { code?: string; message?: string } = {};
  try {
    functions.get("EDGE_SPEED")!([[1], ["x"]], 20, null, none);
  } catch (error) {
    thrown = error as typeof thrown;
  }
  expect(thrown.constructor.name).toBe("ExcelError");
  expect([thrown.code, thrown.message]).toEqual(["#VALUE!", 'EDGE_SPEED needs numbers in cp; row 2 (A2) holds the text "x"']);
});
