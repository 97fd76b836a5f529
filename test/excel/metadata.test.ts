import { readFileSync } from "node:fs";
import Ajv from "ajv/dist/2020";
import { generateCustomFunctionsMetadata, type IFunction } from "custom-functions-metadata";
import { catalogue } from "../../src/cells/generated/catalogue";
import { cellFunctionFiles } from "../../src/record/cell-function-files";

const schema = JSON.parse(readFileSync("test/references/schemas/functions.schema.json", "utf8"));
let made: { functions: IFunction[] };

beforeAll(async () => {
  const result = await generateCustomFunctionsMetadata(cellFunctionFiles(process.cwd()).map((f) => f.path));
  expect(result.errors).toEqual([]); // its command line exits 0 even with errors
  made = JSON.parse(result.metadataJson);
});

test("the metadata Excel reads has only known properties within their limits", () => {
  const check = new Ajv({ allErrors: true }).compile(schema);
  check({ allowErrorForDataTypeAny: true, ...made });
  expect(check.errors ?? []).toEqual([]);
});

test("Microsoft's generator and our own reader find the same functions and arguments", () => {
  const theirs = made.functions.map((f) => [f.name, f.parameters.map((p) => [p.name, p.optional ?? false])]).sort();
  const ours = catalogue.map((e) => [e.name, e.parameters.map((p) => [p.name, p.optional])]).sort();
  expect(theirs).toEqual(ours);
});

test("every argument is declared any, so that our own reader judges and speaks", () => {
  for (const f of made.functions) for (const p of f.parameters) expect([f.name, p.name, p.type]).toEqual([f.name, p.name, "any"]);
});

test("every function asks for the addresses of its arguments", () => {
  for (const f of made.functions) expect([f.name, f.options?.requiresParameterAddresses]).toEqual([f.name, true]);
});
