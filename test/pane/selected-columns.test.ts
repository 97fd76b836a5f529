import type { HostCell } from "../../src/pane/sheet-host";
import { isBlank, placeBeside, selectedColumns } from "../../src/pane/selected-columns";

const cell = (value: HostCell["value"]): HostCell => ({ value, text: String(value ?? "") });
const rows = (values: HostCell["value"][][]) => values.map((row) => row.map(cell));
const at = (left: number, top: number, right: number, bottom: number) => ({ sheet: "Data", left, top, right, bottom });

describe("the columns of a selection", () => {
  test("headings above and blanks below are left off, each column for itself", () => {
    const cells = rows([
      ["station", "edge speed"],
      ["m", "m/s"],
      [0, 1],
      [1, 2],
      [2, null],
      [null, null],
    ]);
    expect(selectedColumns(at(2, 4, 3, 9), cells)).toEqual([at(2, 6, 2, 8), at(3, 6, 3, 7)]);
  });

  test("text and errors inside stay inside, so that the function can name the row", () => {
    const cells = [[cell(1)], [cell("bad")], [{ value: null, text: "#DIV/0!", error: { code: "#DIV/0!", sentence: "" } }], [cell(2)]];
    expect(selectedColumns(at(0, 0, 0, 3), cells)).toEqual([at(0, 0, 0, 3)]);
  });

  test("columns of text, single numbers and blanks are no columns of data", () => {
    expect(selectedColumns(at(0, 0, 2, 2), rows([["a", 1, null], ["b", null, null], ["c", null, null]]))).toEqual([]);
  });
});

describe("the place beside a selection", () => {
  test("leaves one column free", () => {
    expect(placeBeside(at(0, 3, 1, 9), rows([[null, null, null]])[0]!)).toEqual(at(3, 3, 3, 3));
  });

  test("passes over what already stands there", () => {
    expect(placeBeside(at(0, 3, 1, 9), rows([[null, 5, 6, null, null]])[0]!)).toEqual(at(6, 3, 6, 3));
  });

  test("lies behind everything when nothing is free in sight", () => {
    expect(placeBeside(at(0, 0, 0, 0), rows([[1, 2, 3]])[0]!)).toEqual(at(4, 0, 4, 0));
  });

  test("a blank cell of a spill is not blank", () => {
    expect(isBlank({ value: "", text: "", spilledFrom: at(0, 0, 0, 0) })).toBe(false);
    expect(isBlank({ value: "", text: "", formula: '=""' })).toBe(false);
    expect(isBlank({ value: "", text: "" })).toBe(true);
    expect(isBlank(undefined)).toBe(true);
  });
});
