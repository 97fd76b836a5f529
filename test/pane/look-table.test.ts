import { columnUnits } from "../../src/pane/column-units";
import { layerMarkers } from "../../src/pane/layer-markers";
import { lookPanels } from "../../src/pane/look-panels";
import { lookTable } from "../../src/pane/look-table";
import type { HostCell, HostValue } from "../../src/pane/sheet-host";
import { tableCsv } from "../../src/pane/table-csv";

const block = (rows: HostValue[][]): HostCell[][] => rows.map((row) => row.map((value) => ({ value, text: value === null ? "" : String(value) })));
const LAYER: HostValue[][] = [
  ["station x", "edge speed ue", "momentum loss θ", "defect thickness δ*", "shape factor H", "state", "note"],
  [0, 10, 0.0001, 0.00026, 2.6, "laminar", "Thwaites, plane wall; starts at a leading edge"],
  [0.1, 9, 0.0002, 0.00056, 2.8, "laminar", ""],
  [0.2, 8, null, "", "", "separated", "laminar separation at x = 0.153, momentum loss 0.00025"],
];

test("a layer's table gives its columns over the stations, blanks as null, its states, notes and the separation told in them", () => {
  const table = lookTable(block(LAYER), ["m", "m/s", "m", "m", "–", "", ""], undefined)!;
  expect([table.x.heading, table.x.unit, table.x.values]).toEqual(["station x", "m", [0, 0.1, 0.2]]);
  expect(table.columns.map((c) => [c.key, c.unit])).toEqual([["edge_speed", "m/s"], ["momentum_loss", "m"], ["defect", "m"], ["shape", "1"]]);
  expect(table.columns[2]!.values).toEqual([0.00026, 0.00056, null]);
  expect(table.states).toEqual(["laminar", "laminar", "separated"]);
  expect(table.notes.map((n) => n.row)).toEqual([1, 3]);
  expect(table.markers).toEqual([{ x: 0.153, words: "laminar separation 0.153" }]);
});

test("the thicknesses are drawn together, every other column by itself, each with its unit and the markers", () => {
  const panels = lookPanels(lookTable(block(LAYER), ["m", "m/s", "m", "m", "–"], undefined)!, { x: "linear", y: "log" });
  expect(panels.map((p) => p.name)).toEqual(["edge speed ue", "momentum loss θ, defect thickness δ*", "shape factor H"]);
  expect(panels[1]!.chart.y).toEqual({ label: "thickness", unit: "m", kind: "length", scale: "log" });
  expect(panels[1]!.chart.series.map((s) => s.label)).toEqual(["momentum loss θ", "defect thickness δ*"]);
  expect(panels.every((p) => p.chart.markers.length === 1)).toBe(true);
});

test("a column without a value above zero stays linear", () => {
  const table = lookTable(block([["station x", "gradient λ"], [0, -0.1], [1, -0.2]]), [], undefined)!;
  expect(lookPanels(table, { x: "log", y: "log" })[0]!.chart).toMatchObject({ x: { scale: "log" }, y: { scale: "linear" } });
});

test.each([
  ["a single value", [[0.003]], [], undefined],
  ["a list of results", [["quantity", "value"], ["θ", 0.001], ["H", 2.6]], [], undefined],
  ["text only", [["a"], ["b"], ["c"]], [], undefined],
  ["one row below its headings", [["station x", "shape factor H"], [0, 2.6]], [], undefined],
] as [string, HostValue[][], string[], undefined][])("there is nothing to draw in %s", (_what, rows, above, stations) => {
  expect(lookTable(block(rows), above, stations)).toBeUndefined();
});

test("a bare column takes its heading from the cell above it, and its stations from the formula, else it counts rows", () => {
  const bare = [[1.5], [1.6], [1.7]];
  expect(lookTable(block(bare), ["blow velocity dm/dx"], [0, 0.1, 0.2])).toMatchObject({ x: { heading: "station x", values: [0, 0.1, 0.2] }, columns: [{ key: "blow_velocity", values: [1.5, 1.6, 1.7] }] });
  expect(lookTable(block(bare), ["12"], [0, 0.1])).toMatchObject({ x: { heading: "row of the table", values: [1, 2, 3] }, columns: [{ heading: "value" }] });
});

test("a profile is drawn over its height, and a table without stations over its rising first column", () => {
  expect(lookTable(block([["height y", "speed u"], [0, 0], [1, 5]]), [], undefined)!.x.heading).toBe("height y");
  expect(lookTable(block([["Mach", "ratio"], [0, 1], [1, 0.8]]), [], undefined)!.x.heading).toBe("Mach");
  expect(lookTable(block([["ratio", "other"], [3, 1], [1, 0.8]]), [], undefined)!.x.heading).toBe("row of the table");
});

test("units come from the row above only where it holds units; otherwise the kind of quantity is named", () => {
  const columns = [{ key: "station", isNumeric: true }, { key: "momentum_loss", isNumeric: true }, { key: "shape", isNumeric: true }, { key: "note", isNumeric: false }];
  expect(columnUnits(columns, ["mm", "[µm]", "–", ""]).map((c) => c.unit)).toEqual(["mm", "µm", "1", ""]);
  for (const above of [["Run 3, wind tunnel, Tuesday", "", "", ""], ["layer", "", "", ""], []]) {
    expect(columnUnits(columns, above)).toEqual([{ unit: "", kind: "length" }, { unit: "", kind: "length" }, { unit: "", kind: "" }, { unit: "", kind: "" }]);
  }
  expect(columnUnits([{ key: undefined, isNumeric: true }], [])).toEqual([{ unit: "", kind: "" }]);
});

test("onset, bubble and separation of a whole layer are marked in order, each once", () => {
  const notes = [
    { words: "laminar separation at x = 0.31; WARNING bubble: turbulent from x = 0.33, reattaches at x = 0.345, θ 0.0001 to 0.0002 (Horton)" },
    { words: "onset (reattachment) at x = 0.345, Re θ = 300, H from 2.5" },
    { words: "turbulent separation at x = 0.92, momentum loss 0.004 (wall friction 0)" },
  ];
  expect(layerMarkers({ values: [] }, [], notes).map((m) => m.words)).toEqual(["laminar separation 0.31", "reattachment 0.345", "onset 0.345", "turbulent separation 0.92"]);
  expect(layerMarkers({ values: [] }, [], [{ words: "gradient λ reaches 0.25, the end of the method's range, at x = 0.02, momentum loss 1e-5" }])).toEqual([{ x: 0.02, words: "end of the method's range 0.02" }]);
});

test("a table with states but no notes marks the station where the word changes", () => {
  const x = { values: [0, 0.1, 0.2, 0.3] };
  expect(layerMarkers(x, ["laminar", "laminar", "turbulent", "separated"], []).map((m) => m.words)).toEqual(["onset by 0.2", "separated by 0.3"]);
});

test("a table as a file keeps full digits and blanks, quotes what needs it, and no text becomes a formula", () => {
  expect(tableCsv(["x [m]", "note"], [[0.1 + 0.2, 'a, "b"\nc'], [null, "=1+1"], [1e-9, true]])).toBe('x [m],note\r\n0.30000000000000004,"a, ""b""\nc"\r\n,\'=1+1\r\n1e-9,TRUE\r\n');
});
