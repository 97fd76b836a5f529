import fc from "fast-check";
import { blockAddress, columnLetters, readAddress } from "../../src/pane/cell-block";

describe("addresses of blocks", () => {
  test.each([
    ["A1", { sheet: "Data", left: 0, top: 0, right: 0, bottom: 0 }],
    ["$B$2:$C$9", { sheet: "Data", left: 1, top: 1, right: 2, bottom: 8 }],
    ["C9:B2", { sheet: "Data", left: 1, top: 1, right: 2, bottom: 8 }],
    ["Other!aa10", { sheet: "Other", left: 26, top: 9, right: 26, bottom: 9 }],
    ["'My ''first'' sheet'!A1:A3", { sheet: "My 'first' sheet", left: 0, top: 0, right: 0, bottom: 2 }],
    [" F4 ", { sheet: "Data", left: 5, top: 3, right: 5, bottom: 3 }],
  ])("%s is read", (written, block) => {
    expect(readAddress(written, "Data")).toEqual(block);
  });

  test.each(["", "A", "A0", "5", "A1:", "!A1", "A1:B2:C3", "nonsense", "=A1", "''!A1"])("%j is no address", (written) => {
    expect(readAddress(written, "Data")).toBeUndefined();
  });

  test.each([
    ["Data", "Data", "B2:C3"],
    ["Data", "Other", "Data!B2:C3"],
    ["My sheet", "Data", "'My sheet'!B2:C3"],
    ["It's", "Data", "'It''s'!B2:C3"],
    ["H12", "Data", "'H12'!B2:C3"],
  ])("a block of %s is named on %s as %s", (sheet, on, address) => {
    expect(blockAddress({ sheet, left: 1, top: 1, right: 2, bottom: 2 }, on)).toBe(address);
  });

  test("what is written is read back, for any block and sheet name", () => {
    const bound = (largest: number) => fc.tuple(fc.integer({ min: 0, max: largest }), fc.integer({ min: 0, max: largest })).map(([a, b]) => [Math.min(a, b), Math.max(a, b)] as const);
    fc.assert(
      fc.property(fc.string({ minLength: 1 }), bound(16383), bound(1048575), (sheet, [left, right], [top, bottom]) => {
        const block = { sheet, left, top, right, bottom };
        expect(readAddress(blockAddress(block), "elsewhere")).toEqual(block);
      }),
    );
  });

  test("columns count as in a sheet", () => {
    expect([0, 25, 26, 701, 702, 16383].map(columnLetters)).toEqual(["A", "Z", "AA", "ZZ", "AAA", "XFD"]);
  });
});
