import { CAUTIONS } from "../cells/cautions";
import { readAddress, type CellBlock } from "../pane/cell-block";
import { chartFigure } from "./chart-figure";
import { gliderDrag } from "./glider-drag";
import { hullPlate } from "./hull-plate";
import { threeMarches } from "./three-marches";

/**
 * The book the bench opens on: an invented survey glider's wing section, upper side. The edge speeds are made up with the shape an
 * inviscid solution of such a section has (stagnation point, quick rise, long gentle rise, slow fall to the station of a planned trip); they are nobody's data.
 */
const SHEET = "Wing section";
const STATIONS: readonly (readonly [x: number, ue: number])[] = [
  [0, 0],
  [0.005, 8.81],
  [0.01, 15.83],
  [0.02, 23.18],
  [0.035, 25.94],
  [0.055, 26.62],
  [0.08, 27.02],
  [0.11, 27.41],
  [0.145, 27.77],
  [0.185, 28.04],
  [0.225, 28.17],
  [0.265, 28.16],
  [0.305, 28.01],
  [0.345, 27.71],
  [0.385, 27.28],
];
const VISCOSITY = 1.5e-5;
const COLUMNS = "station, edge_speed, momentum_loss, defect, shape, friction, mass_defect, state, note";

/** Rows counted from 1, as in the sheet. */
const HEADING_ROW = 18;
const FIRST = HEADING_ROW + 1;
const LAST = HEADING_ROW + STATIONS.length;

const STYLES = {
  1: { bold: true, fontSize: 14 },
  2: { textColor: "#545d63", italic: true },
  3: { textColor: "#6d4a00" },
  4: { bold: true, wrapping: "wrap", verticalAlign: "bottom" },
  5: { fillColor: "#eaf3f5" },
  6: { textColor: "#545d63", align: "right" },
  8: { bold: true, verticalAlign: "bottom" },
  7: { bold: true, align: "right", wrapping: "wrap", verticalAlign: "bottom" },
} as const;
const FORMATS = { 1: "0.000", 2: "0.00", 3: "0.00e", 4: "0.00e", 5: "0.00e", 6: "0.000", 7: "0.000000" } as const;
const LOOK = { title: 1, remark: 2, caution: 3, unit: 6, heading: 7, station: 1, small: 4, ratio: 6, section: 4, count: 7 } as const;

/** The starter book in the grid library's data form (version 19.3.2). */
export function starterBook(): Record<string, unknown> {
  const cells: Record<string, string> = {
    A1: "Survey glider, wing section, upper side: laminar layer from the stagnation point",
    A2: "Invented scenario, invented numbers: no such aircraft. Edge speed shaped like an inviscid solution at 22 m/s, chord 0.60 m.",
    A3: CAUTIONS[0]!,
    A4: "Change a shaded cell: the table and both charts follow.",
    A5: "Settings",
    A6: "kinematic viscosity ν [m²/s]",
    B6: String(VISCOSITY),
    A8: "Options of the march",
    A9: "edge fit",
    B9: "spline",
    A10: "columns",
    B10: COLUMNS,
    A12: "Input check",
    A13: `=INDEX(WALL.INPUT_CHECK(A${FIRST}:A${LAST},B${FIRST}:B${LAST},B6),2,2)`,
    [`A${HEADING_ROW - 1}`]: "m",
    [`B${HEADING_ROW - 1}`]: "m/s",
    [`A${HEADING_ROW}`]: "station x",
    [`B${HEADING_ROW}`]: "edge speed ue",
    [`D${HEADING_ROW}`]: `=WALL.THWAITES_MARCH(A${FIRST}:A${LAST},B${FIRST}:B${LAST},B6,A9:B10)`,
    [`N${HEADING_ROW - 1}`]: "m/s",
    [`N${HEADING_ROW}`]: "blow velocity dm/dx",
    [`N${FIRST}`]: `=LET(m,WALL.COLUMN_OF(D${HEADING_ROW}#,"mass_defect"),reached,ISNUMBER(m),WALL.WALL_BLOW_VELOCITY(FILTER(A${FIRST}:A${LAST},reached),FILTER(m,reached),0))`,
  };
  ["m", "m/s", "m", "m", "–", "–", "m²/s"].forEach((unit, i) => (cells[`${"DEFGHIJ"[i]}${HEADING_ROW - 1}`] = unit));
  STATIONS.forEach(([x, ue], i) => {
    cells[`A${FIRST + i}`] = String(x);
    cells[`B${FIRST + i}`] = String(ue);
  });
  const rows = (column: string) => `${column}${FIRST}:${column}${LAST}`;
  return {
    version: "19.3.2",
    sheets: [
      {
        id: "wing",
        name: SHEET,
        rowNumber: 200,
        colNumber: 40,
        cells,
        cols: Object.fromEntries([[0, 180], [1, 84], [2, 12], ...[3, 4, 5, 6, 7, 8, 9, 10].map((c) => [c, 98]), [11, 260], [12, 12], [13, 100]].map(([c, size]) => [c, { size }])),
        rows: { [HEADING_ROW - 1]: { size: 40 } },
        styles: {
          A1: 1,
          A2: 2,
          A3: 3,
          A4: 2,
          A5: 4,
          A8: 4,
          B6: 5,
          B9: 5,
          B10: 5,
          A12: 4,
          [`A${HEADING_ROW - 1}:N${HEADING_ROW - 1}`]: 6,
          [`A${HEADING_ROW}:J${HEADING_ROW}`]: 7,
          [`K${HEADING_ROW}:L${HEADING_ROW}`]: 8,
          [`N${HEADING_ROW}`]: 7,
          [`A${FIRST}:B${LAST}`]: 5,
        },
        formats: { B6: 3, [rows("A")]: 1, [rows("B")]: 2, [rows("D")]: 1, [rows("E")]: 2, [`F${FIRST}:G${LAST}`]: 4, [rows("H")]: 1, [rows("I")]: 5, [rows("J")]: 5, [rows("N")]: 6 },
        figures: [
          chartFigure(
            {
              title: "Momentum loss and defect thickness",
              x: block(rows("D")),
              xLabel: "station x [m]",
              series: [
                { label: "momentum loss θ", values: block(rows("F")) },
                { label: "defect thickness δ*", values: block(rows("G")) },
              ],
              yLabel: "thickness [m]",
              at: block("D5"),
            },
            "thicknesses",
            { width: 294, height: 270 },
          ),
          chartFigure(
            { title: "Blow velocity at the wall", x: block(rows("A")), xLabel: "station x [m]", series: [{ label: "blow velocity dm/dx", values: block(rows("N")) }], yLabel: "dm/dx [m/s]", at: block("G5") },
            "blow-velocity",
            { width: 294, height: 270 },
          ),
        ],
      },
      threeMarches({ sheet: SHEET, x: rows("A"), ue: rows("B"), nu: "B6", stations: STATIONS.length }, LOOK),
      gliderDrag(LOOK, 5),
      hullPlate(LOOK, 5),
    ],
    styles: STYLES,
    formats: FORMATS,
  };
}

function block(address: string): CellBlock {
  return readAddress(address, SHEET)!;
}
