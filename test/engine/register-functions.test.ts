import { evaluateFormula } from "../../src/engine/evaluate";
import { SheetError, type SheetFunction } from "../../src/engine/sheet-function";
import { wallSheetFunction } from "../../src/engine/wall-functions";
import { CellError } from "../../src/cells/errors/cell-error";
import { book, preparedEngine, textAt, valueAt } from "./prepared-engine";

const any = (name: string, optional = false) => ({ name, description: `the ${name}`, optional });
let seen: { args: readonly unknown[]; addresses: readonly (string | undefined)[] };

const functions: SheetFunction[] = [
  {
    name: "TRY.LOOK",
    description: "Keeps what it is given.",
    category: "Trial",
    parameters: [any("first"), any("second", true), any("third", true)],
    call(args, addresses) {
      seen = { args, addresses };
      return args.filter((arg) => arg !== undefined).length;
    },
  },
  { name: "TRY.TABLE", description: "A table.", category: "Trial", parameters: [], call: () => [["x", "note"], [1, ""], [2.5, null]] },
  {
    name: "TRY.FAIL",
    description: "Fails as asked.",
    category: "Trial",
    parameters: [any("how")],
    call([how]) {
      const word = (how as unknown[][])[0]![0];
      if (word === "sentence") throw new CellError("#VALUE!", "FAIL needs rising x; row 7 (A11) repeats 0.35");
      if (word === "no answer") throw new CellError("#N/A", "FAIL finds no separation");
      if (word === "nan") return NaN;
      if (word === "promise") return Promise.resolve(1);
      if (word === "empty") return [];
      if (word === "nan inside") return [[1, Infinity]];
      if (word === "nothing") return null;
      throw new TypeError("x is not a function");
    },
  },
  wallSheetFunction(
    {
      name: "TRIAL",
      family: "Trial",
      purpose: "Shows how a cell function is called.",
      parameters: [
        { name: "x", description: "Stations.", unit: "length", optional: false },
        { name: "noise", description: "Noise.", unit: "", optional: true },
      ],
      gives: "text",
      resultUnit: "text",
      limits: [],
      sources: [],
      examples: [],
      words: [],
    },
    (x, noise, invocation) => JSON.stringify([x, noise, invocation]),
  ),
];

const engine = preparedEngine(functions);

describe("a registered function", () => {
  it("gets ranges as rows × columns with blanks as null, and their addresses with the sheet's name", () => {
    book(engine, { A1: "1", B1: "x", A2: "TRUE", A3: "=1/0", D1: "=TRY.LOOK(A1:B3,A1)" });
    const { args, addresses } = seen;
    expect(args[0]).toEqual([[1, "x"], [true, null], [expect.objectContaining({ code: "#DIV/0!" }), null]]);
    expect((args[0] as unknown[][])[2]![0]).toBeInstanceOf(SheetError);
    expect(args.slice(1)).toEqual([[[1]], undefined]);
    expect(addresses).toEqual(["Sheet1!A1:B3", "Sheet1!A1", undefined]);
  });

  it("gets no address for a calculated array, and an empty argument as omitted", () => {
    book(engine, { A1: "1", A2: "2", D1: "=TRY.LOOK(A1:A2*2,,5)" });
    expect(seen).toEqual({ args: [[[2], [4]], undefined, [[5]]], addresses: [undefined, undefined, undefined] });
  });

  it("gets the address of a spill and of a range handed through LET", () => {
    book(engine, { A1: "=SEQUENCE(3)", D1: "=LET(r,A1#,TRY.LOOK(r))" });
    expect(seen).toEqual({ args: [[[1], [2], [3]], undefined, undefined], addresses: ["Sheet1!A1:A3", undefined, undefined] });
  });

  it("quotes the sheet's name in an address where a formula would need quotes", () => {
    const model = new engine.library.Model({
      sheets: [
        { id: "a", name: "Run 2", rowNumber: 5, colNumber: 5, cells: { B2: "7" } },
        { id: "b", name: "Sheet2", rowNumber: 5, colNumber: 5, cells: { A1: "=TRY.LOOK('Run 2'!B2)" } },
      ],
    });
    expect(model.getters.getEvaluatedCell({ sheetId: "b", col: 0, row: 0 }).value).toBe(1);
    expect(seen.addresses[0]).toBe("'Run 2'!B2");
  });

  it("spills its table below and beside, and follows an edit of its input", () => {
    const model = book(engine, { A1: "=TRY.TABLE()", D1: "=COUNTA(A1#)", E1: "1", E2: "=TRY.LOOK(E1)+E1" });
    expect(["A1", "B1", "A2", "B2", "A3", "B3"].map((xc) => valueAt(model, xc))).toEqual(["x", "note", 1, "", 2.5, ""]);
    expect(model.dispatch("UPDATE_CELL", { sheetId: "s", col: 4, row: 0, content: "41" }).isSuccessful).toBe(true);
    expect(valueAt(model, "E2")).toBe(42);
  });

  it.each([
    ["sentence", "#VALUE!", "FAIL needs rising x; row 7 (A11) repeats 0.35"],
    ["no answer", "#N/A", "FAIL finds no separation"],
    ["nan", "#NUM!", "The result is not a finite number."],
    ["promise", "#VALUE!", "TRY.FAIL failed: it returned neither a value nor a table"],
    ["empty", "#VALUE!", "TRY.FAIL failed: it returned an empty or ragged table"],
    ["bug", "#VALUE!", "TRY.FAIL failed: x is not a function"],
  ])("that fails by %s gives %s with a sentence", (how, code, sentence) => {
    expect(evaluateFormula(engine, `=TRY.FAIL("${how}")`)).toMatchObject({ code, message: sentence });
    expect(evaluateFormula(engine, `=IFERROR(TRY.FAIL("${how}"),"caught")`)).toBe("caught");
  });

  it("never hands a bad number inside a table or a null on to the grid", () => {
    expect(evaluateFormula(engine, '=TRY.FAIL("nan inside")')).toEqual([[1, expect.objectContaining({ code: "#NUM!" })]]);
    expect(evaluateFormula(engine, '=TRY.FAIL("nothing")')).toBe("");
  });

  it("shows its sentence in the cell", () => {
    const model = book(engine, { A1: '=TRY.FAIL("sentence")' });
    expect(model.getters.getEvaluatedCell({ sheetId: "s", col: 0, row: 0 })).toMatchObject({ type: "error", value: "#ERROR", message: "FAIL needs rising x; row 7 (A11) repeats 0.35" });
  });

  it("is listed with its argument help, and refuses too few arguments with a sentence", () => {
    const entry = engine.library.registries.functionRegistry.get("TRY.LOOK");
    expect(entry).toMatchObject({ description: "Keeps what it is given.", category: "Trial" });
    expect(entry.args.map((arg) => [arg.name, arg.description, arg.optional ?? false])).toEqual([["first", "the first", false], ["second", "the second", true], ["third", "the third", true]]);
    expect(evaluateFormula(engine, "=TRY.LOOK()")).toMatchObject({ message: "TRY.LOOK needs at least 1 argument; it has 0." });
  });

  it("of the cells room is called as Excel calls it: null for an omitted argument, the invocation last", () => {
    const model = book(engine, { A1: "1", A2: "2", D1: "=WALL.TRIAL(A1:A2)" });
    expect(valueAt(model, "D1")).toBe('[[[1],[2]],null,{"parameterAddresses":["Sheet1!A1:A2",""]}]');
  });

  it("keeps the spelling of a stored add-in call readable", () => {
    const model = book(engine, { A1: "1", D1: "=_xldudf_WALL_TRIAL(A1)" });
    expect(textAt(model, "D1")).toBe("=WALL.TRIAL(A1)");
  });
});
