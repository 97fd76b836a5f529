import { CAUTIONS } from "../cells/cautions";
import { readAddress, type CellBlock } from "../pane/cell-block";
import { chartFigure } from "./chart-figure";
import type { SheetLook } from "./three-marches";

const SHEET = "Glider drag";

/**
 * Pressure taps round the section from the tail over the upper side to the nose and back along the lower side: x [m], y [m], cp. Made up: a thin cambered shape of
 * conformal mapping at 2.5°, its tail pressures relieved by hand as a layer would relieve them. No such aircraft, no such test.
 */
const TAPS: readonly (readonly [x: number, y: number, cp: number])[] = [
  [0.6, 0, 0.15], [0.5912, 0.0017, 0.118], [0.5733, 0.0054, 0.056], [0.547, 0.011, -0.032], [0.5137, 0.0179, -0.134], [0.4748, 0.0256, -0.241],
  [0.4317, 0.0334, -0.351], [0.3855, 0.0405, -0.461], [0.3376, 0.0465, -0.567], [0.2893, 0.0507, -0.666], [0.2415, 0.0529, -0.755], [0.1956, 0.0529, -0.83],
  [0.1524, 0.0506, -0.889], [0.113, 0.0461, -0.932], [0.0783, 0.0399, -0.956], [0.049, 0.0322, -0.961], [0.0261, 0.0235, -0.937], [0.01, 0.0144, -0.833],
  [0.0014, 0.0054, -0.292], [0.0007, -0.0029, 0.971], [0.0082, -0.0103, 0.626], [0.0236, -0.0166, 0.25], [0.0468, -0.0214, 0.079], [0.0771, -0.0246, 0.006],
  [0.1139, -0.026, -0.016], [0.1564, -0.0257, -0.01], [0.2036, -0.0238, 0.013], [0.2543, -0.0207, 0.044], [0.307, -0.0167, 0.078], [0.3603, -0.0125, 0.108],
  [0.4123, -0.0083, 0.13], [0.4612, -0.0048, 0.145], [0.5052, -0.0022, 0.153], [0.5425, -0.0005, 0.157], [0.5715, 0.0001, 0.157], [0.5908, 0.0002, 0.154],
];
const HEADING_ROW = 36;
const FIRST = HEADING_ROW + 1;
const LAST = HEADING_ROW + TAPS.length;
/** Rows a side's table may take. */
const ROOM = 30;
const COLUMNS = "station, edge_speed, momentum_loss, defect, shape, friction, state, note";
/** Stations next to the stagnation point, whose large cf would flatten the rest of a chart. */
const NEAR_NOSE = 4;
const SIDES = [
  { side: "upper", taps: "E", layer: "K", column: "B" },
  { side: "lower", taps: "U", layer: "AA", column: "C" },
] as const;

/** Taps of both sides to layer, onset and drag of each side and of the section. */
export function gliderDrag(look: SheetLook, input: number): Record<string, unknown> {
  const taps = (letter: string) => `${letter}${FIRST}:${letter}${LAST}`;
  const cells: Record<string, string> = {
    A1: "Survey glider, wing section: from pressure taps to the drag of both sides",
    A2: "Invented scenario, invented numbers: no such aircraft, no such test. Change a shaded cell and everything follows.",
    A3: CAUTIONS[0]!,
    A5: "Settings",
    A6: "flight speed U [m/s]",
    B6: "22",
    A7: "kinematic viscosity ν [m²/s]",
    B7: "0.000015",
    A8: "chord [m]",
    B8: "0.6",
    A9: "Options of both marches",
    A10: "onset",
    B10: "free",
    A11: "turbulent method",
    B11: "lag",
    A12: "edge fit",
    B12: "monotone",
    A13: "columns",
    B13: COLUMNS,
    A15: "Result",
    B15: "upper side",
    C15: "lower side",
    D15: "section",
    A16: "onset station [m]",
    A17: "onset by",
    A18: "laminar separation station [m]",
    A19: "turbulent separation station [m]",
    A20: "H at the tail",
    A21: "friction drag coefficient",
    A22: "profile drag coefficient (wake)",
    A23: "of that pressure drag",
    D21: "=SUM(B21:C21)",
    D22: "=SUM(B22:C22)",
    D23: "=D22-D21",
    A24: "Profile drag is Squire and Young's from the tail; empty where a side separates. Stations count from the stagnation point along the wall.",
    [`A${HEADING_ROW - 1}`]: "m",
    [`B${HEADING_ROW - 1}`]: "m",
    [`C${HEADING_ROW - 1}`]: "–",
    [`A${HEADING_ROW}`]: "tap x",
    [`B${HEADING_ROW}`]: "tap y",
    [`C${HEADING_ROW}`]: "cp",
  };
  TAPS.forEach((tap, i) => tap.forEach((v, c) => (cells[`${"ABC"[c]}${FIRST + i}`] = String(v))));
  for (const { side, taps: at, layer, column } of SIDES) {
    const surface = `${at}${HEADING_ROW}#`;
    const table = `${layer}${HEADING_ROW}#`;
    cells[`${at}${HEADING_ROW - 2}`] = `${side} side: SURFACE_FROM_TAPS`;
    cells[`${layer}${HEADING_ROW - 2}`] = `${side} side: LAYER_MARCH`;
    cells[`${at}${HEADING_ROW}`] = `=WALL.SURFACE_FROM_TAPS(${taps("A")},${taps("B")},${taps("C")},"${side}",B6)`;
    cells[`${layer}${HEADING_ROW}`] = `=WALL.LAYER_MARCH(WALL.COLUMN_OF(${surface},"station"),WALL.COLUMN_OF(${surface},"edge_speed"),B7,A10:B13)`;
    ["m", "m", "m", "m/s"].forEach((unit, i) => (cells[`${shift(at, i)}${HEADING_ROW - 1}`] = unit));
    ["m", "m/s", "m", "m", "–", "–"].forEach((unit, i) => (cells[`${shift(layer, i)}${HEADING_ROW - 1}`] = unit));
    const summary = (row: number) => `=INDEX(WALL.LAYER_SUMMARY(${table},B6,B8),${row},2)`;
    cells[`${column}16`] = summary(2);
    cells[`${column}17`] = summary(3);
    cells[`${column}18`] = summary(4);
    cells[`${column}19`] = summary(6);
    cells[`${column}20`] = summary(11);
    cells[`${column}21`] = summary(14);
    // At the tail itself, or nothing.
    cells[`${column}22`] = `=IF(${column}19="",WALL.WAKE_DRAG(INDEX(WALL.LAYER_SUMMARY(${table}),9,2),${column}20,INDEX(WALL.LAYER_SUMMARY(${table}),8,2)/B6,,B8),"")`;
  }
  const column = (layer: string, offset: number, from: number, rows: number) => block(`${shift(layer, offset)}${FIRST + from}:${shift(layer, offset)}${FIRST + rows - 1}`);
  const upper = 21;
  const lower = 18;
  const chart = (title: string, yLabel: string, offset: number, layer: string, from: number, rows: number, label: string, at: string, id: string) =>
    chartFigure({ title, x: column(layer, 0, from, rows), xLabel: "station x [m]", series: [{ label, values: column(layer, offset, from, rows) }], yLabel, at: block(at) }, id, { width: at.startsWith("F") ? 263 : 299, height: 270 });
  const width = (letters: string, size: number): [number, { size: number }] => [columnIndex(letters), { size }];
  return {
    id: "glider",
    name: SHEET,
    rowNumber: HEADING_ROW + TAPS.length + ROOM,
    colNumber: 44,
    cells,
    cols: Object.fromEntries([
      width("A", 210), width("B", 130), width("C", 130), width("D", 96), width("J", 12), width("T", 12), width("Z", 12),
      ...["E", "F", "G", "H", "K", "L", "M", "N", "O", "P", "U", "V", "W", "X", "AA", "AB", "AC", "AD", "AE", "AF"].map((c) => width(c, 88)),
      ...["I", "R", "Y", "AH"].map((c) => width(c, 200)),
    ]),
    rows: { [HEADING_ROW - 1]: { size: 40 } },
    styles: {
      A1: look.title, A2: look.remark, A3: look.caution, A24: look.remark, A5: look.section, A9: look.section, "A15:D15": look.section,
      B6: input, B7: input, B8: input, B10: input, B11: input, B12: input, B13: input,
      [`A${HEADING_ROW - 2}:AH${HEADING_ROW - 2}`]: look.remark, [`A${HEADING_ROW - 1}:AH${HEADING_ROW - 1}`]: look.unit, [`A${HEADING_ROW}:AH${HEADING_ROW}`]: look.heading,
      [`A${FIRST}:C${LAST}`]: input,
    },
    formats: {
      B7: look.small, "B16:C16": look.station, "B18:C19": look.station, "B20:C20": look.ratio, "B21:D23": look.count,
      [`A${FIRST}:B${LAST}`]: look.station, [`C${FIRST}:C${LAST}`]: look.ratio,
      ...Object.fromEntries(
        SIDES.flatMap(({ taps: t, layer: l }) => [
          [`${t}${FIRST}:${shift(t, 2)}${FIRST + ROOM}`, look.station],
          [`${shift(t, 3)}${FIRST}:${shift(t, 3)}${FIRST + ROOM}`, look.ratio],
          [`${l}${FIRST}:${l}${FIRST + ROOM}`, look.station],
          [`${shift(l, 1)}${FIRST}:${shift(l, 1)}${FIRST + ROOM}`, look.ratio],
          [`${shift(l, 2)}${FIRST}:${shift(l, 3)}${FIRST + ROOM}`, look.small],
          [`${shift(l, 4)}${FIRST}:${shift(l, 4)}${FIRST + ROOM}`, look.ratio],
          [`${shift(l, 5)}${FIRST}:${shift(l, 5)}${FIRST + ROOM}`, look.small],
        ]),
      ),
    },
    figures: [
      chart("Upper side: shape factor", "H [–]", 4, "K", 0, upper, "shape factor H", "F5", "glider-upper-shape"),
      chart("Upper side: wall friction", "cf [–]", 5, "K", NEAR_NOSE, upper, "wall friction cf", "I5", "glider-upper-friction"),
      chart("Lower side: shape factor", "H [–]", 4, "AA", 0, lower, "shape factor H", "F19", "glider-lower-shape"),
      chart("Lower side: wall friction", "cf [–]", 5, "AA", NEAR_NOSE, lower, "wall friction cf", "I19", "glider-lower-friction"),
    ],
  };
}

function columnIndex(letters: string): number {
  return [...letters].reduce((n, c) => n * 26 + c.charCodeAt(0) - 64, 0) - 1;
}

function shift(letters: string, by: number): string {
  let n = columnIndex(letters) + by + 1;
  let out = "";
  for (; n > 0; n = Math.floor((n - 1) / 26)) out = String.fromCharCode(65 + ((n - 1) % 26)) + out;
  return out;
}

function block(address: string): CellBlock {
  return readAddress(address, SHEET)!;
}
