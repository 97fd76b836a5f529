import { openCall } from "../../../src/cells/reading/call";
import { spillColumn, spillTable } from "../../../src/cells/writing/spill-table";

const call = openCall("THWAITES_MARCH");
const columns = [
  { key: "note", values: ["start"] },
  { key: "shape", values: Float64Array.of(2.6, NaN), blank: Uint8Array.of(0, 1) },
  { key: "station", values: Float64Array.of(0, 1, 2) },
] as const;

test("a table has a heading row, the fixed order, and empty text where there is nothing to say", () => {
  expect(spillTable(call, 3, columns)).toEqual([
    ["station x", "shape factor H", "note"],
    [0, 2.6, "start"],
    [1, "", ""],
    [2, "", ""],
  ]);
});

test("the columns option selects and orders", () => {
  expect(spillTable(call, 1, columns, ["shape", "station"])).toEqual([["shape factor H", "station x"], [2.6, 0]]);
});

test("a column the table has not is refused", () => {
  expect(() => spillTable(call, 1, columns, ["heat"])).toThrow("THWAITES_MARCH needs columns it gives; it has no heat, only note, shape, station");
});

test("a number that is not finite is never spilled", () => {
  expect(() => spillColumn(Float64Array.of(1, Infinity))).toThrow("not finite");
  expect(() => spillTable(call, 1, [{ key: "shape", values: [NaN] }])).toThrow("not finite");
});
