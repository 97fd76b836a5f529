import { loadHeadless } from "../../src/engine/load-headless";
import { prepareEngine } from "../../src/engine/prepare-engine";
import { book, preparedEngine, textAt, valueAt } from "./prepared-engine";

const engine = preparedEngine();
const { library } = engine;

describe("prepareEngine", () => {
  it("installs the seams once for a library", () => {
    expect(prepareEngine(library, [])).toBe(engine);
  });

  it("says which seam does not behave, and stops", () => {
    const broken = loadHeadless(process.cwd());
    // As if a later version kept its compiled formulas elsewhere: our compiler is never asked.
    Object.defineProperty(broken, "functionCache", { value: {} });
    expect(() => prepareEngine(broken, [])).toThrow(/sheet engine does not behave[\s\S]*precedence\): =-2\^2 gives -4/);
  });

  it("says when formula text comes back changed", () => {
    const broken = loadHeadless(process.cwd());
    const prototype = broken.CompiledFormula.prototype;
    Object.defineProperty(prototype, "toFormulaString", { get: () => () => "=-A1^2", set: () => undefined });
    expect(() => prepareEngine(broken, [])).toThrow(/the text =-2\^2 comes back as =-A1\^2/);
  });

  it("compiles without evaluating text as code, as the bench's page demands", () => {
    const { Function: evaluating } = globalThis;
    const fresh = preparedEngine();
    const asItComes = loadHeadless(process.cwd());
    let evaluations = 0;
    const count = () => {
      evaluations++;
      throw new Error("text was evaluated as code");
    };
    globalThis.Function = new Proxy(evaluating, { apply: count, construct: count });
    try {
      const model = book(fresh, { A1: "3", B1: "=A1^2+SUM(A1:A2)*{1,2}", B2: "=LET(a,A1,a+1)", B3: "=A1+", B4: "=NO.SUCH(A1)" });
      expect(["B1", "C1", "B2", "B3", "B4"].map((xc) => valueAt(model, xc))).toEqual([12, 15, 4, "#BAD_EXPR", "#NAME?"]);
      expect(evaluations).toBe(0);
      // The count sees what it should: the library as it comes does evaluate text.
      valueAt(book({ ...fresh, library: asItComes }, { A1: "=1+1" }), "A1");
      expect(evaluations).toBe(1);
    } finally {
      globalThis.Function = evaluating;
    }
  });
});

describe("formulas in a book", () => {
  it.each([
    "=-(A1^2)",
    "=(-A1)^2",
    "=-A1^2",
    '=LOG10(A1) & "a""b"',
    "=LET(f, LAMBDA(x, x+1), f(2))",
    "=IF( A1 > 2 , #N/A , 1 )",
    "=SUM($A$1:A2)*2%",
    "=@A1:A3",
    "=2^3^2",
    "=A1#",
    "=FOO(A1,1)",
    "=A1+",
  ])("%s keeps its text in the cell, in the composer and in a saved book", (formula) => {
    const model = book(engine, { A1: "2", C1: formula });
    expect(textAt(model, "C1")).toBe(formula);
    const composer = { getters: model.getters };
    const cell = model.getters.getCell({ sheetId: "s", col: 2, row: 0 })!;
    expect(library.stores.CellComposerStore.prototype.getPrettifiedFormula.call(composer, cell)).toBe(formula);
    const again = new library.Model(JSON.parse(JSON.stringify(model.exportData())));
    expect(textAt(again, "C1")).toBe(formula);
    expect(valueAt(again, "C1")).toBe(valueAt(model, "C1"));
  });

  it("moves the references of a formula with inserted rows, text, LET and unknown functions included", () => {
    const model = book(engine, { A5: "7", C1: '=LET(x,A5,LOG10(10)+x)&"""A5"', C2: "=FOO(A5)" });
    expect(valueAt(model, "C1")).toBe('8"A5');
    expect(model.dispatch("ADD_COLUMNS_ROWS", { sheetId: "s", sheetName: "Sheet1", dimension: "ROW", base: 2, position: "after", quantity: 2 }).isSuccessful).toBe(true);
    expect(textAt(model, "C1")).toBe('=LET(x,A7,LOG10(10)+x)&"""A5"');
    expect(textAt(model, "C2")).toBe("=FOO(A7)");
    expect(valueAt(model, "C1")).toBe('8"A5');
  });

  it("follows a named range and its new name", () => {
    const model = new library.Model({ namedRanges: { nu: "Sheet1!A1" }, sheets: [{ id: "s", name: "Sheet1", rowNumber: 9, colNumber: 9, cells: { A1: "5", B1: "=nu*2", B2: "=LET(a,nu,a+nu)" } }] });
    expect([valueAt(model, "B1"), valueAt(model, "B2")]).toEqual([10, 10]);
    const renamed = model.dispatch("UPDATE_NAMED_RANGE", { oldRangeName: "nu", newRangeName: "viscosity", ranges: [{ _sheetId: "s", _zone: { left: 0, right: 0, top: 0, bottom: 0 } }] });
    expect(renamed.isSuccessful).toBe(true);
    expect(textAt(model, "B1")).toBe("=viscosity*2");
    model.dispatch("UPDATE_CELL", { sheetId: "s", col: 0, row: 0, content: "6" });
    expect([valueAt(model, "B1"), valueAt(model, "B2")]).toEqual([12, 12]);
  });

  it("reads a range in the formula's own row where @ asks for it", () => {
    const model = book(engine, { A1: "10", A2: "20", A3: "30", C2: "=@A1:A3", C3: "=@A1:A2", D1: "=_xlfn.SINGLE(A1:A3)+1" });
    expect([valueAt(model, "C2"), valueAt(model, "C3"), valueAt(model, "D1")]).toEqual([20, "#ERROR", 11]);
  });

  it("takes blanks as 0 in arithmetic, as nothing in text, and as TRUE for ISBLANK", () => {
    const model = book(engine, { B1: "=A1+1", B2: '=A1&"x"', B3: "=ISBLANK(A1)", B4: '=A1=""', B5: "=A1=0", B6: "=A1", B7: "=SUM(A1:A3)" });
    expect(["B1", "B2", "B3", "B4", "B5", "B6", "B7"].map((xc) => valueAt(model, xc))).toEqual([1, "x", true, true, true, 0, 0]);
  });

  it("evaluates only the branch of IF that is taken, so a guarded cell is no circle", () => {
    const model = book(engine, { A1: "=IF(C1,1,B1)", B1: "=A1+1", C1: "TRUE", D1: "=IF(C1:C2,A1,7)" });
    expect(["A1", "B1", "D1", "D2"].map((xc) => valueAt(model, xc))).toEqual([1, 2, 1, 7]);
  });

  it("copies, pastes and undoes text with Excel's spellings", () => {
    const model = book(engine, { B1: "10", B4: "1000", F1: '=LOG10(B1)&"x""y"' });
    const selection = (model as unknown as { selection: { selectCell(col: number, row: number): void } }).selection;
    selection.selectCell(5, 0);
    expect(model.dispatch("COPY").isSuccessful).toBe(true);
    expect(model.dispatch("PASTE", { target: [{ left: 5, right: 5, top: 3, bottom: 3 }] }).isSuccessful).toBe(true);
    expect([textAt(model, "F4"), valueAt(model, "F4")]).toEqual(['=LOG10(B4)&"x""y"', '3x"y']);
    model.dispatch("REQUEST_UNDO");
    expect(textAt(model, "F4")).toBeUndefined();
  });

  it("saves and reads a column of like formulas, which the engine stores as differences", () => {
    const cells: Record<string, string> = {};
    for (let i = 1; i <= 8; i++) Object.assign(cells, { [`B${i}`]: `${10 ** i}`, [`A${i}`]: `=LOG10(B${i}) & "a""b${i}"`, [`C${i}`]: `=-B${i}^2 + @B1:B8`, [`D${i}`]: `=LET(q, B${i}*${i}, q+1)` });
    const model = book(engine, cells);
    const again = new library.Model(JSON.parse(JSON.stringify(model.exportData())));
    for (const xc of Object.keys(cells)) expect([xc, textAt(again, xc), valueAt(again, xc)]).toEqual([xc, textAt(model, xc), valueAt(model, xc)]);
    expect([textAt(again, "A7"), valueAt(again, "A7"), valueAt(again, "C3"), valueAt(again, "D8")]).toEqual(['=LOG10(B7) & "a""b7"', '7a"b7', 1e6 + 1e3, 8e8 + 1]);
  });

  it("calls a bad formula bad, and does not ask a registry for names that LET made", () => {
    const { IsBadExpression } = library.CompiledFormula;
    expect(["=1+", "=SUM(", "=LET(a,1)", "=LET(A1,1,2)", "=SQRT()", "=(1"].map((f) => IsBadExpression.call(library.CompiledFormula, f))).toEqual([true, true, true, true, true, true]);
    expect(IsBadExpression.call(library.CompiledFormula, '=LET(f,LAMBDA(x,x&""""),f(2))')).toBe(false);
    expect(library.registries.functionRegistry.get("F")).toMatchObject({ hidden: true });
  });
});
