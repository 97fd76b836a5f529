import fc from "fast-check";
import { boxName, boxSize, cellBox, cellName, cellPlace } from "../../src/workbook/cell-reference";

test("columns count A to Z, AA to ZZ, AAA to XFD", () => {
  // Corner cell of a sheet: 16 384 columns and 1 048 576 rows (Microsoft, "Excel specifications and limits", from memory).
  expect(cellPlace("XFD1048576")).toEqual({ column: 16_384, row: 1_048_576 });
  expect(["A1", "Z1", "AA1", "ZZ1", "AAA1"].map((name) => cellPlace(name).column)).toEqual([1, 26, 27, 702, 703]);
  expect(cellPlace("$B$12")).toEqual({ column: 2, row: 12 });
});

test("a name and its place belong together", () => {
  fc.assert(fc.property(fc.integer({ min: 1, max: 16_384 }), fc.integer({ min: 1, max: 1_048_576 }), (column, row) => expect(cellPlace(cellName(column, row))).toEqual({ column, row })));
});

test("blocks are read from any corner and named by the upper left one", () => {
  expect(cellBox("C4:A1")).toEqual({ left: 1, top: 1, right: 3, bottom: 4 });
  expect([boxName(cellBox("$C$4:A1")), boxName(cellBox("B2")), boxName(cellBox("B2:B2"))]).toEqual(["A1:C4", "B2", "B2"]);
  expect([boxSize(cellBox("B2")), boxSize(cellBox("A1:XFD1048576"))]).toEqual([1, 2 ** 34]);
});

test.each(["", "A", "1", "A0", "$$", "XFE1", "A1048577", "AAAA1", "A1B"])('"%s" is no address', (text) => {
  expect(() => cellPlace(text)).toThrow(/stands in it as the address of a cell\.$/);
});
