import { installSpillReference } from "../../src/engine/install-spill-reference";
import { preparedEngine } from "./prepared-engine";

const engine = preparedEngine();
installSpillReference(engine.library);
installSpillReference(engine.library); // a second time changes nothing

/** The spill stands on the second sheet; the first has other values at the same place. */
function book(firstSheetLast: boolean) {
  const sheets = [
    { id: "s", name: "One", rowNumber: 20, colNumber: 10, cells: { A1: "=SUM('It is'!C1#)", A2: "=SUM(C1#)", B5: "='It is'!C1#", C1: "=SEQUENCE(2)" } },
    { id: "t", name: "It is", rowNumber: 20, colNumber: 10, cells: { C1: "=SEQUENCE(B1)*10", B1: "3" } },
  ];
  return new engine.library.Model({ sheets: firstSheetLast ? sheets.reverse() : sheets });
}

test.each([false, true])("a spill on another sheet is read there, in either order of the sheets (%s)", (firstSheetLast) => {
  const model = book(firstSheetLast);
  const value = (col: number, row: number) => model.getters.getEvaluatedCell({ sheetId: "s", col, row }).value;
  expect([value(0, 0), value(0, 1)]).toEqual([60, 3]);
  expect([value(1, 4), value(1, 5), value(1, 6), value(1, 7)]).toEqual([10, 20, 30, null]);
  // It follows an edit over there, growing.
  model.dispatch("UPDATE_CELL", { sheetId: "t", col: 1, row: 0, content: "4" });
  expect([value(0, 0), value(0, 1), value(1, 7)]).toEqual([100, 3, 40]);
});
