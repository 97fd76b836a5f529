import { installBlockWriter } from "../../src/bench/block-writer";
import { gridHost } from "../../src/bench/grid-host";
import type { GridLibrary, GridModel } from "../../src/bench/grid-library";
import { loadHeadless } from "../../src/engine/load-headless";
import { prepareEngine } from "../../src/engine/prepare-engine";
import { SheetError } from "../../src/engine/sheet-function";
import { readAddress } from "../../src/pane/cell-block";
import type { SheetHost } from "../../src/pane/sheet-host";

// The grid library calls it when one command changes many cells; browsers have it, Node has it from 21 on.
const withGroupBy = Object as unknown as { groupBy?: <T>(items: Iterable<T>, key: (item: T, index: number) => PropertyKey) => Record<PropertyKey, T[]> };
withGroupBy.groupBy ??= (items, key) => {
  const groups: Record<PropertyKey, (typeof items extends Iterable<infer T> ? T : never)[]> = Object.create(null) as never;
  let i = 0;
  for (const item of items) (groups[key(item, i++)] ??= []).push(item as never);
  return groups as never;
};

const library = loadHeadless(process.cwd()) as GridLibrary;
const x = { name: "x", description: "", optional: false };
prepareEngine(library, [
  {
    name: "WALL.TWICE",
    description: "",
    category: "",
    parameters: [x],
    call: ([rows]) =>
      (rows as unknown[][]).map(([value], i) => {
        if (typeof value !== "number") throw new SheetError("#VALUE!", `TWICE needs numbers in x; row ${i + 1} holds text`);
        return [2 * value];
      }),
  },
]);

installBlockWriter(library);

let model: GridModel;
let host: SheetHost;
const block = (address: string) => readAddress(address, "Data")!;

beforeEach(() => {
  model = new library.Model({
    version: "19.3.2",
    sheets: [
      { id: "one", name: "Data", rowNumber: 20, colNumber: 8, cells: { A1: "x", A2: "1", A3: "2.5", A4: "TRUE", C2: "=WALL.TWICE(A2:A3)", D2: '=WALL.TWICE(A1:A2)', E2: "=1+1" } },
      { id: "two", name: "More data", rowNumber: 20, colNumber: 8, cells: { B2: "=WALL.TWICE(Data!A2)" } },
    ],
  });
  host = gridHost(model);
});

describe("the grid as a sheet host", () => {
  it("reads values, formulas, spills and error sentences", async () => {
    const [row2, row3] = await host.read(block("A2:E3"));
    expect(row2![0]).toEqual({ value: 1, text: "1" });
    expect(row2![1]).toEqual({ value: null, text: "" });
    expect(row2![2]).toEqual({ value: 2, text: "2", formula: "=WALL.TWICE(A2:A3)" });
    expect(row2![3]).toMatchObject({ value: null, formula: "=WALL.TWICE(A1:A2)", error: { code: "#VALUE!", sentence: "TWICE needs numbers in x; row 1 holds text" } });
    expect(row2![4]).toMatchObject({ value: 2, formula: "=1+1" });
    expect(row3![2]).toEqual({ value: 5, text: "5", spilledFrom: block("C2") });
    expect((await host.read(block("A4")))[0]![0]).toMatchObject({ value: true });
  });

  it("clips what is read to the sheet, and reads one blank cell outside it", async () => {
    const rows = await host.read(block("G19:Z99"));
    expect([rows.length, rows[0]!.length]).toEqual([2, 2]);
    expect(await host.read(block("ZZ500"))).toEqual([[{ value: null, text: "" }]]);
  });

  it("writes a formula in one undoable step", async () => {
    await host.writeFormula(block("G2"), "=WALL.TWICE(A2:A3)");
    expect((await host.read(block("G3")))[0]![0]).toMatchObject({ value: 5, spilledFrom: block("G2") });
    model.dispatch("REQUEST_UNDO");
    expect((await host.read(block("G2")))[0]![0]).toEqual({ value: null, text: "" });
  });

  it("refuses to write outside the sheet, in a sentence", async () => {
    await expect(host.writeFormula(block("ZZ500"), "=1")).rejects.toThrow(/^The formula could not be written into Data!ZZ500/);
    await expect(host.writeFormula({ ...block("A1"), sheet: "Gone" }, "=1")).rejects.toThrow('There is no sheet "Gone" in this book.');
  });

  it("writes values in one undoable step, text as text", async () => {
    await host.writeValues(block("F5"), [["θ", 1.25e-5], [true, null], ["=1+1", "-"], ["'quoted", "12"], ["TRUE", "# of taps"], ["1/2", "-5"]]);
    const rows = await host.read(block("F5:G10"));
    expect(rows.map((row) => row.map((cell) => cell.value))).toEqual([["θ", 1.25e-5], [true, null], ["=1+1", "-"], ["'quoted", "12"], ["TRUE", "# of taps"], ["1/2", "-5"]]);
    expect(rows[2]![0]!.formula).toBeUndefined();
    model.dispatch("REQUEST_UNDO");
    expect((await host.read(block("F5:G10"))).flat().every((cell) => cell.value === null)).toBe(true);
  });

  it("refuses values that do not fit, and writes none of them", async () => {
    await expect(host.writeValues(block("H20"), [[1, 2]])).rejects.toThrow("The values do not fit on the sheet at Data!H20.");
    expect((await host.read(block("H20")))[0]![0]!.value).toBeNull();
  });

  it("writes to a sheet that is not shown", async () => {
    await host.writeValues(block("'More data'!A1"), [[7]]);
    expect((await host.read(block("'More data'!A1")))[0]![0]!.value).toBe(7);
  });

  test("the table over a cell is found from its own cell and from any cell it spills over", async () => {
    const table = { at: block("C2"), formula: "=WALL.TWICE(A2:A3)", spill: block("C2:C3") };
    expect(await host.tableAt(block("C2"))).toEqual(table);
    expect(await host.tableAt(block("C3:D9"))).toEqual(table);
    expect((await host.tableAt(block("D2")))!.error!.sentence).toContain("TWICE needs numbers");
    for (const other of ["A2", "E2", "H20"]) expect(await host.tableAt(block(other))).toBeUndefined();
  });

  it("lists the WALL cells of every sheet with their spills and errors", async () => {
    expect(await host.wallCells()).toEqual([
      { at: block("C2"), formula: "=WALL.TWICE(A2:A3)", spill: block("C2:C3") },
      { at: block("D2"), formula: "=WALL.TWICE(A1:A2)", spill: block("D2"), error: { code: "#VALUE!", sentence: "TWICE needs numbers in x; row 1 holds text" } },
      { at: block("'More data'!B2"), formula: "=WALL.TWICE(Data!A2)", spill: block("'More data'!B2") },
    ]);
  });

  it("goes to a block of another sheet and reports it as the selection", async () => {
    await host.goTo(block("'More data'!B2:C3"));
    expect(await host.selection()).toEqual(block("'More data'!B2:C3"));
  });

  it("draws a chart whose data are the given columns", async () => {
    await host.insertChart({ title: "T", x: block("A2:A3"), xLabel: "x [m]", series: [{ label: "twice", values: block("C2:C3") }], yLabel: "y", at: block("E5") });
    const [id] = (model.getters.getChartIds as (sheet: string) => string[])("one");
    const runtime = (model.getters.getChartRuntime as (id: string) => { chartJsConfig: { data: { datasets: { label: string; data: { x: string; y: number }[] }[] } } })(id!);
    expect(runtime.chartJsConfig.data.datasets[0]).toMatchObject({ label: "twice", data: [{ x: "1", y: 2 }, { x: "2.5", y: 5 }] });
  });

  it("calls back once for the changes before a frame, and no more when ended", async () => {
    const frames: (() => void)[] = [];
    globalThis.requestAnimationFrame = (callback) => frames.push(() => callback(0));
    const listener = jest.fn();
    const stop = host.whenChanged(listener);
    await host.writeFormula(block("G2"), "=1");
    await host.goTo(block("B2"));
    frames.splice(0).forEach((frame) => frame());
    expect(listener).toHaveBeenCalledTimes(1);
    stop();
    await host.goTo(block("B3"));
    frames.splice(0).forEach((frame) => frame());
    expect(listener).toHaveBeenCalledTimes(1);
  });
});
