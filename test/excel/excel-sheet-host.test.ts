import { excelSheetHost } from "../../src/excel/excel-sheet-host";
import { installStandIn, StandInBook } from "./excel-standin";

let book: StandInBook;
const host = excelSheetHost();
const block = (sheet: string, left: number, top: number, right = left, bottom = top) => ({ sheet, left, top, right, bottom });

beforeEach(() => {
  book = new StandInBook();
  book.sheets.set("Sheet1", new Map());
  book.sheets.set("Wing data", new Map([
    ["A1", { value: "x" }],
    ["A2", { value: 0.1 }],
    ["B2", { value: "station x", formula: "=WALL.THWAITES_MARCH(A2:A3,A2:A3,1E-5)", spillsTo: "B2:C3" }],
    ["C2", { value: "edge speed ue", formula: "=WALL.THWAITES_MARCH(A2:A3,A2:A3,1E-5)", spilledFrom: "B2" }],
    ["A3", { value: 0.2 }],
    ["D4", { value: "#VALUE!", formula: "=wall.mass_defect(A1:A2)", isError: true }],
    ["E4", { value: 1, formula: '=LEN("WALL.X")' }],
  ]));
  installStandIn(book);
});

test("the stand-in refuses a property that was not loaded and synced", async () => {
  const run = (globalThis as unknown as { Excel: { run(work: (c: never) => Promise<void>): Promise<void> } }).Excel.run;
  await expect(run(async (context: { workbook: { getSelectedRange(): { address: string } } }) => void context.workbook.getSelectedRange().address as never)).rejects.toThrow("load it and call context.sync() first");
});

test("the selection is told with its sheet, in one round trip", async () => {
  book.selected = { sheet: "Wing data", address: "A2:B9" };
  expect(await host.selection()).toEqual(block("Wing data", 0, 1, 1, 8));
  expect(book.syncs).toBe(1);
});

test("several separate blocks are refused in a sentence", async () => {
  book.several = true;
  await expect(host.selection()).rejects.toThrow("Select one block of cells");
});

test("a block is read clipped to the used part, in two round trips", async () => {
  const cells = await host.read(block("Wing data", 0, 0, 0, 1_048_575));
  expect(cells.map((row) => row[0]!.value)).toEqual(["x", 0.1, 0.2, null]);
  expect(book.syncs).toBe(2);
});

test("a single cell tells its formula, its error, or the cell that spilled it", async () => {
  expect((await host.read(block("Wing data", 3, 3)))[0]![0]).toMatchObject({ formula: "=wall.mass_defect(A1:A2)", error: { code: "#VALUE!", sentence: "" } });
  const spilled = (await host.read(block("Wing data", 2, 1)))[0]![0]!;
  expect(spilled.spilledFrom).toEqual(block("Wing data", 1, 1));
  expect(spilled.formula).toBeUndefined();
  expect((await host.read(block("Sheet1", 5, 5)))[0]![0]!.value).toBeNull();
});

test("a formula goes into the block's first cell", async () => {
  await host.writeFormula(block("Sheet1", 2, 2, 5, 9), "=WALL.EDGE_SPEED(A1,20)");
  expect(book.cell("Sheet1", "C3")?.formula).toBe("=WALL.EDGE_SPEED(A1,20)");
  // A book with our functions starts them when it is opened again.
  expect(book.startup).toBe("Load");
});

test("values are written as they are, and text never becomes a formula", async () => {
  await host.writeValues(block("Sheet1", 0, 0), [["label", 1], ["=1+1", null]]);
  expect(book.cell("Sheet1", "A1")?.value).toBe("label");
  expect(book.cell("Sheet1", "A2")?.value).toBe("'=1+1");
  expect(book.cell("Sheet1", "B2")?.value).toBe("");
});

test("WALL cells are found on every sheet, in any case, once a spill, and not inside text", async () => {
  const found = await host.wallCells();
  expect(found.map((f) => f.at)).toEqual([block("Wing data", 1, 1), block("Wing data", 3, 3)]);
  expect(found[0]!.spill).toEqual(block("Wing data", 1, 1, 2, 2));
  expect(found[1]!.error?.code).toBe("#VALUE!");
  expect(book.syncs).toBe(3);
});

test("the table over a cell is found from its own cell and from any cell it spills over, in two round trips", async () => {
  const table = { at: block("Wing data", 1, 1), formula: "=WALL.THWAITES_MARCH(A2:A3,A2:A3,1E-5)", spill: block("Wing data", 1, 1, 2, 2) };
  expect(await host.tableAt(block("Wing data", 1, 1))).toEqual(table);
  expect(book.syncs).toBe(2);
  expect(await host.tableAt(block("Wing data", 2, 1, 5, 9))).toEqual(table);
  expect(await host.tableAt(block("Wing data", 3, 3))).toMatchObject({ at: block("Wing data", 3, 3), error: { code: "#VALUE!" } });
  for (const [column, row] of [[0, 1], [4, 3], [9, 9]] as const) expect(await host.tableAt(block("Wing data", column, row))).toBeUndefined();
});

test("a chart gets its series, x column, labels and place", async () => {
  await host.insertChart({
    title: "Growth", x: block("Wing data", 0, 1, 0, 2), xLabel: "x, m", yLabel: "θ, m", at: block("Wing data", 6, 0),
    series: [{ label: "θ", values: block("Wing data", 1, 1, 1, 2) }, { label: "δ*", values: block("Wing data", 2, 1, 2, 2) }],
  });
  expect(book.charts).toEqual([{ sheet: "Wing data", title: "Growth", x: ["A2:A3", "A2:A3"], values: ["B2:B3", "C2:C3"], names: ["θ", "δ*"], at: "G1" }]);
});

test("going to a cell shows its sheet", async () => {
  await host.goTo(block("Wing data", 3, 3));
  expect(book.selected).toEqual({ sheet: "Wing data", address: "D4" });
});

test("Excel's refusals become sentences", async () => {
  book.editing = true;
  await expect(host.writeFormula(block("Sheet1", 0, 0), "=1")).rejects.toThrow("Excel is in the middle of editing a cell");
  await expect(host.read(block("Gone", 0, 0))).rejects.toThrow("The sheet is no longer in the workbook.");
});

test("changes call back until the watching ends", async () => {
  const listener = jest.fn();
  const stop = host.whenChanged(listener);
  await new Promise((resolve) => setImmediate(resolve));
  expect(book.handlers.size).toBeGreaterThan(0);
  for (const handler of book.handlers) await handler();
  expect(listener).toHaveBeenCalled();
  stop();
  await new Promise((resolve) => setImmediate(resolve));
  await new Promise((resolve) => setImmediate(resolve));
  expect(book.handlers.size).toBe(0);
});
