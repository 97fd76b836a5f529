import type { CellBox } from "../../src/workbook/cell-reference";
import { spillBlocks, type BlockOf } from "../../src/workbook/spill-blocks";

const BLOCKS: Readonly<Record<string, CellBox>> = {
  "D3": { left: 4, top: 3, right: 7, bottom: 18 },
  "M8": { left: 13, top: 8, right: 13, bottom: 8 },
  "Läufe 'B'!D3": { left: 4, top: 3, right: 4, bottom: 5 },
};
const blockOf: BlockOf = (sheet, reference) => BLOCKS[sheet === undefined ? reference : `${sheet}!${reference}`];

test.each([
  ["SUM(_xlfn.ANCHORARRAY(D3))", "SUM(D3:G18)"],
  ["INDEX(_xlfn.ANCHORARRAY($D$3),0,2)+1", "INDEX($D$3:$G$18,0,2)+1"],
  ["_XLFN.anchorarray(d$3)", "d$3:G$18"],
  ["SUM(_xlfn.ANCHORARRAY('Läufe ''B'''!$D3))", "SUM('Läufe ''B'''!$D3:$D5)"],
  ["_xlfn.ANCHORARRAY(M8)*2", "M8*2"],
  ["_xlfn.ANCHORARRAY(E9)&\"_xlfn.ANCHORARRAY(D3)\"", "_xlfn.ANCHORARRAY(E9)&\"_xlfn.ANCHORARRAY(D3)\""],
  ["D3*2", "D3*2"],
])("%s → %s", (formula, plain) => {
  expect(spillBlocks(formula, blockOf)).toBe(plain);
});

test("a name for the cell is followed; one for another cell is left", () => {
  expect(spillBlocks("SUM(_xlfn.ANCHORARRAY(march))", blockOf, () => "$D$3")).toBe("SUM($D$3:$G$18)");
  expect(spillBlocks("SUM(_xlfn.ANCHORARRAY(march))", blockOf, () => "Wing!$X$1")).toBe("SUM(_xlfn.ANCHORARRAY(march))");
});
