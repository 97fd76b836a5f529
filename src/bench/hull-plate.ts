import { CAUTIONS } from "../cells/cautions";
import { readAddress, type CellBlock } from "../pane/cell-block";
import { chartFigure } from "./chart-figure";
import type { SheetLook } from "./three-marches";

const SHEET = "Hull plate";

/** Waterline of an invented river ferry: distance from the bow [m] and edge speed over ship speed, slow at the bow, fast amidships, slowing to the stern. */
const STATIONS: readonly (readonly [x: number, ratio: number])[] = [
  [0, 0.9], [0.5, 0.935], [1, 0.958], [2, 0.986], [3.5, 1.012], [5, 1.028], [7.5, 1.043], [10, 1.05], [13, 1.052], [16, 1.05],
  [19, 1.044], [22, 1.034], [25, 1.018], [27.5, 1], [30, 0.976], [32, 0.952], [34, 0.924], [35.5, 0.9],
];
const HEADING_ROW = 36;
const FIRST = HEADING_ROW + 1;
const LAST = HEADING_ROW + STATIONS.length;

/** A hull's side as a plate with a pressure gradient: turbulent from the bow, against the ITTC 1957 line. */
export function hullPlate(look: SheetLook, input: number): Record<string, unknown> {
  const rows = (letter: string) => `${letter}${FIRST}:${letter}${LAST}`;
  const table = `E${HEADING_ROW}#`;
  const cells: Record<string, string> = {
    A1: "River ferry, hull side as a plate with a pressure gradient",
    A2: "Invented scenario, invented numbers: no such ship. Smooth hull, no waves, no propeller; turbulent from the bow.",
    A3: CAUTIONS[0]!,
    A5: "Settings",
    A6: "ship speed U [m/s]",
    B6: "5",
    A7: "kinematic viscosity ν [m²/s]",
    B7: "0.0000011386",
    A8: "(fresh water, 15 °C)",
    A9: "Options of the march",
    A10: "onset",
    B10: "from start",
    A11: "turbulent method",
    B11: "lag",
    A13: "Result",
    A14: "Re of the waterline",
    B14: `=B6*(A${LAST}-A${FIRST})/B7`,
    A15: "friction coefficient of the side",
    B15: `=INDEX(WALL.LAYER_SUMMARY(${table},B6),14,2)`,
    A16: "ITTC 1957 line at that Re",
    B16: "=0.075/(LOG10(B14)-2)^2",
    A17: "ratio",
    B17: "=B15/B16",
    A18: "turbulent separation station [m]",
    B18: `=INDEX(WALL.LAYER_SUMMARY(${table},B6),6,2)`,
    A19: "defect thickness δ* at the stern [m]",
    B19: `=INDEX(WALL.LAYER_SUMMARY(${table},B6),10,2)`,
    A20: "layer height δ at the stern [m]",
    B20: `=INDEX(WALL.COLUMN_OF(${table},"layer_height"),ROWS(${rows("A")}))`,
    A21: "The line is a plate's in two dimensions with an allowance for small models; the ratio shows what the gradient does.",
    [`A${HEADING_ROW - 1}`]: "m",
    [`B${HEADING_ROW - 1}`]: "–",
    [`C${HEADING_ROW - 1}`]: "m/s",
    [`A${HEADING_ROW}`]: "from the bow",
    [`B${HEADING_ROW}`]: "ue/U",
    [`C${HEADING_ROW}`]: "edge speed ue",
    [`E${HEADING_ROW}`]: `=WALL.LAYER_MARCH(${rows("A")},${rows("C")},B7,A10:B11)`,
  };
  ["m", "m/s", "m", "m", "m", "–", "m", "–", "–", "–", "m²/s", "m/s", "–", "–"].forEach((unit, i) => (cells[`${String.fromCharCode(69 + i)}${HEADING_ROW - 1}`] = unit));
  STATIONS.forEach(([x, ratio], i) => {
    cells[`A${FIRST + i}`] = String(x);
    cells[`B${FIRST + i}`] = String(ratio);
    cells[`C${FIRST + i}`] = `=B${FIRST + i}*$B$6`;
  });
  const chart = (title: string, yLabel: string, series: { label: string; letter: string }[], at: string, id: string) =>
    chartFigure({ title, x: block(rows("E")), xLabel: "from the bow [m]", series: series.map((s) => ({ label: s.label, values: block(rows(s.letter)) })), yLabel, at: block(at) }, id, { width: 380, height: 300 });
  // The columns of a whole-layer table in their fixed order: station, ue, θ, δ*, δ3, H, δ, cf, Reθ, λ, m, dm∕dx, CE, γ, state, note.
  const ratio = [rows("J")];
  const small = ["G", "H", "I", "K", "L", "M", "N", "O", "P", "Q"].map(rows);
  return {
    id: "hull",
    name: SHEET,
    rowNumber: 120,
    colNumber: 30,
    cells,
    cols: Object.fromEntries([[0, 230], [1, 110], [2, 90], [3, 12], ...Array.from({ length: 14 }, (_, i) => [4 + i, 92]), [18, 92], [19, 320]].map(([c, size]) => [c, { size }])),
    rows: { [HEADING_ROW - 1]: { size: 40 } },
    styles: {
      A1: look.title, A2: look.remark, A3: look.caution, A21: look.remark, A8: look.remark, A5: look.section, A9: look.section, A13: look.section,
      B6: input, B7: input, B10: input, B11: input,
      [`A${HEADING_ROW - 1}:R${HEADING_ROW - 1}`]: look.unit, [`A${HEADING_ROW}:T${HEADING_ROW}`]: look.heading, [`A${FIRST}:B${LAST}`]: input,
    },
    formats: {
      B7: look.small, B14: look.small, "B15:B16": look.count, B17: look.ratio, "B19:B20": look.station,
      [rows("C")]: look.ratio, [rows("E")]: look.station, [rows("F")]: look.ratio,
      ...Object.fromEntries(ratio.map((r) => [r, look.ratio])), ...Object.fromEntries(small.map((r) => [r, look.small])),
    },
    figures: [
      chart("Wall friction", "cf [–]", [{ label: "wall friction cf", letter: "L" }], "D5", "hull-friction"),
      chart("Thicknesses", "thickness [m]", [{ label: "momentum loss θ", letter: "G" }, { label: "defect thickness δ*", letter: "H" }], "I5", "hull-thicknesses"),
    ],
  };
}

function block(address: string): CellBlock {
  return readAddress(address, SHEET)!;
}
