import type { CellBlock } from "../../src/pane/cell-block";
import { checkBook } from "../../src/pane/check-book";
import type { HostCell, SheetHost, WallCell } from "../../src/pane/sheet-host";

const block = (left: number, top: number, right = left, bottom = top): CellBlock => ({ sheet: "Data", left, top, right, bottom });
const cellOf = (value: HostCell["value"]): HostCell => ({ value, text: value === null ? "" : String(value) });

/** A host that holds one sheet of values and a list of WALL cells. */
function hostOf(cells: readonly (readonly HostCell["value"][])[], wall: readonly WallCell[]): SheetHost {
  const refuse = async (): Promise<never> => {
    throw new Error("not asked for here");
  };
  return {
    name: "a test",
    selection: refuse,
    writeFormula: refuse,
    writeValues: refuse,
    insertChart: refuse,
    tableAt: refuse,
    goTo: refuse,
    whenChanged: () => () => {},
    wallCells: async () => wall,
    read: async (b) => Array.from({ length: b.bottom - b.top + 1 }, (_, r) => Array.from({ length: b.right - b.left + 1 }, (_, c) => cellOf(cells[b.top + r]?.[b.left + c] ?? null))),
  };
}

// A1:B4 stations and speeds; D1:F4 a table.
const SHEET: readonly (readonly HostCell["value"][])[] = [
  [0, 1, null, "momentum loss θ", "state", "note"],
  [1, 1, null, 0.1, "laminar", "Thwaites, plane wall; settings that speak of separation"],
  [2, 0.9, null, 0.2, "laminar", ""],
  [3, 0.5, null, "", "separated", "laminar separation at x = 2.5, momentum loss 0.25"],
];
const march = (formula: string, error?: WallCell["error"]): WallCell => ({ at: block(3, 0), formula, spill: block(3, 0, 5, 3), ...(error && { error }) });

test("a table with a separated row is to be looked at, with the note that says where; the settings in the first row's note are none", async () => {
  const [found] = await checkBook(hostOf(SHEET, [march("=WALL.THWAITES_MARCH(A1:A4,B1:B4,0.0001)")]));
  expect(found!.verdict).toBe("warning");
  expect(found!.words).toContain("1 row is separated");
  expect(found!.words).toContain("laminar separation at x = 2.5, momentum loss 0.25");
  expect(found!.words.join()).not.toContain("settings");
});

test("the inputs of a march are checked where they are plain ranges", async () => {
  const [found] = await checkBook(hostOf(SHEET, [march("=WALL.THWAITES_MARCH(A1:A4,B1:B4,0.0001)")]));
  expect(found!.words).toContain("input usable with care");
  expect(found!.words.join()).toContain("stations: only 4 (add stations where ue bends)");
  const [other] = await checkBook(hostOf(SHEET, [march("=WALL.THWAITES_MARCH(SORT(A1:A4),B1:B4,0.0001)")]));
  expect(other!.words.join()).not.toContain("input");
});

test("an input that cannot be used names its row", async () => {
  const bad = SHEET.map((row, i) => (i === 2 ? [0.5, ...row.slice(1)] : row));
  const [found] = await checkBook(hostOf(bad, [march("=WALL.THWAITES_MARCH(A1:A4,B1:B4,0.0001)", { code: "#VALUE!", sentence: "THWAITES_MARCH needs rising x; row 3 falls to 0.5 after 1" })]));
  expect(found!.verdict).toBe("error");
  expect(found!.words[0]).toBe("#VALUE!: THWAITES_MARCH needs rising x; row 3 falls to 0.5 after 1");
  expect(found!.words).toContain("input not usable");
});

test("a cell with nothing to remark is fine; cells come in the book's order and progress is told", async () => {
  const value: WallCell = { at: block(0, 5), formula: "=SUM(WALL.EDGE_SPEED(A1:A4,10))", spill: block(0, 5) };
  const told: string[] = [];
  const found = await checkBook(hostOf(SHEET, [value, march("=WALL.COLUMN_OF(D9#,1)")]), (done, of) => told.push(`${done}/${of}`));
  expect(found.map((f) => [f.functions.join(), f.verdict])).toEqual([["EDGE_SPEED", "fine"], ["COLUMN_OF", "warning"]]);
  expect(told).toEqual(["0/2", "1/2", "2/2"]);
});
