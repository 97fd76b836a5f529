import { engineErrorCode, engineMatrix, engineValue, excelErrorCode, sheetRows, sheetValue, storedErrorCode } from "../../src/engine/engine-values";
import { SheetError } from "../../src/engine/sheet-function";
import { preparedEngine } from "./prepared-engine";

describe("values between the engine and Excel", () => {
  it.each([
    ["#ERROR", "#VALUE!"],
    ["#REF", "#REF!"],
    ["#N/A", "#N/A"],
    ["#NAME?", "#NAME?"],
    ["#DIV/0!", "#DIV/0!"],
    ["#NUM!", "#NUM!"],
    ["#NULL!", "#NULL!"],
    ["#SPILL!", "#SPILL!"],
  ])("%s is Excel's %s, both ways", (engine, excel) => {
    expect(excelErrorCode(engine)).toBe(excel);
    expect(engineErrorCode(excel)).toBe(engine);
  });

  it("knows every error code of the library", () => {
    const codes = Object.values((preparedEngine().library as unknown as { CellErrorType: Record<string, string> }).CellErrorType);
    expect(codes.length).toBeGreaterThan(8);
    for (const code of codes) expect(sheetValue({ value: code })).toBeInstanceOf(SheetError);
  });

  it.each([
    ["#BAD_EXPR", "#NAME?"],
    ["#CYCLE", "#REF!"],
  ])("%s, which Excel has not, is %s", (engine, excel) => expect(excelErrorCode(engine)).toBe(excel));

  it("stores codes of newer versions as #VALUE! in a file", () => {
    expect(["#SPILL!", "#CALC!", "#N/A"].map(storedErrorCode)).toEqual(["#VALUE!", "#VALUE!", "#N/A"]);
  });

  it("turns columns of the engine into rows and back", () => {
    const rows = [[1, "a", true], [null, new SheetError("#N/A", "none"), 2]];
    const matrix = [[{ value: 1 }, { value: null }], [{ value: "a" }, { value: "#N/A", message: "none" }], [{ value: true }, { value: 2 }]];
    expect(sheetRows(matrix)).toEqual(rows);
    expect(engineMatrix(rows)).toEqual([[{ value: 1 }, { value: "" }], [{ value: "a" }, { value: "#N/A", message: "none" }], [{ value: true }, { value: 2 }]]);
    expect(engineMatrix([["x", "y"], [1]])).toEqual([[{ value: "x" }, { value: 1 }], [{ value: "y" }, { value: "" }]]);
  });

  it("lets no infinity, date or function into a cell", () => {
    expect(engineValue(Infinity)).toMatchObject({ value: "#NUM!" });
    expect(sheetValue({ value: -Infinity })).toMatchObject({ code: "#NUM!" });
    expect(engineValue(() => 1)).toMatchObject({ value: "#ERROR" });
    expect(engineValue(new Date())).toMatchObject({ value: "#ERROR" });
  });
});
