import { catalogue } from "../../src/cells/generated/catalogue";
import { evaluateFormula } from "../../src/engine/evaluate";
import { wallSheetFunctions } from "../../src/engine/wall-functions";
import { book, preparedEngine, textAt } from "./prepared-engine";

const functions = wallSheetFunctions();
const engine = preparedEngine(functions);

describe("the cell functions in the sheet engine", () => {
  it("are all there under the namespace, with purpose, arguments and units as help", () => {
    expect(functions.map((f) => f.name)).toEqual(catalogue.map((entry) => `WALL.${entry.name}`));
    expect(engine.functionNames).toEqual(functions.map((f) => f.name));
    for (const entry of catalogue) {
      const known = engine.library.registries.functionRegistry.get(`WALL.${entry.name}`);
      expect(known.description).toBe(entry.purpose);
      expect(known.args.map((arg) => [arg.name, arg.optional ?? false])).toEqual(entry.parameters.map((p) => [p.name, p.optional]));
      known.args.forEach((arg, i) => expect(arg.description).toContain(entry.parameters[i]!.unit));
    }
  });

  it("pick a column of a table by its heading, in a cell", () => {
    // By hand: the column below "value" is 2, 3.
    expect(evaluateFormula(engine, '=WALL.COLUMN_OF({"station x","value";0,2;1,3},"value")')).toEqual([[2], [3]]);
    const model = book(engine, { A1: "station x", B1: "value", A2: "0", B2: "2", A3: "1", B3: "3", D1: '=SUM(_xldudf_WALL_COLUMN_OF(A1:B3,"value"))' });
    expect(model.getters.getEvaluatedCell({ sheetId: "s", col: 3, row: 0 }).value).toBe(5);
    expect(textAt(model, "D1")).toBe('=SUM(WALL.COLUMN_OF(A1:B3,"value"))');
  });

  it("refuse a heading that is not there with a sentence", () => {
    expect(evaluateFormula(engine, '=WALL.COLUMN_OF({"station x","value";0,2},"valve")')).toMatchObject({ code: expect.stringMatching(/^#(N\/A|VALUE!)$/), message: expect.stringContaining("COLUMN_OF") });
  });
});
