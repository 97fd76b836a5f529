import { CAUTIONS } from "../cells/cautions";
import { readAddress, type CellBlock } from "../pane/cell-block";
import { chartFigure } from "./chart-figure";

/** Styles and formats of the starter book, by what they are for. */
export interface SheetLook {
  title: number;
  remark: number;
  caution: number;
  unit: number;
  heading: number;
  station: number;
  small: number;
  ratio: number;
  /** Bold heading of a block, and coefficients with six decimals. */
  section: number;
  count: number;
}

const SHEET = "Three marches";
const HEADING_ROW = 22;
const FIRST = HEADING_ROW + 1;
const METHODS = [
  { name: "THWAITES_MARCH", label: "Thwaites", column: "C" },
  { name: "ENERGY_MARCH", label: "momentum and energy", column: "G" },
  { name: "FIELD_MARCH", label: "full equations", column: "K" },
] as const;
const CHART = { width: 394, height: 372 };

/** A sheet that marches one edge-speed column by the three laminar methods side by side, so that their spread can be seen. */
export function threeMarches(source: { sheet: string; x: string; ue: string; nu: string; stations: number }, look: SheetLook): Record<string, unknown> {
  const last = HEADING_ROW + source.stations;
  const from = (range: string) => `'${source.sheet}'!${range}`;
  const cells: Record<string, string> = {
    A1: "The same edge-speed column by three laminar methods",
    A2: "Inputs from the sheet before this one (invented). The full equations are the referee: where the others part from them, trust those less.",
    A3: CAUTIONS[0]!,
    [`A${HEADING_ROW - 1}`]: "m",
    [`A${HEADING_ROW}`]: "station x",
    [`A${FIRST}`]: `=${from(source.x)}`,
  };
  const styles: Record<string, number> = { A1: look.title, A2: look.remark, A3: look.caution, [`A${HEADING_ROW - 2}:M${HEADING_ROW - 2}`]: look.remark, [`A${HEADING_ROW - 1}:M${HEADING_ROW - 1}`]: look.unit, [`A${HEADING_ROW}:M${HEADING_ROW}`]: look.heading };
  const formats: Record<string, number> = { [`A${FIRST}:A${last}`]: look.station };
  for (const { name, label, column } of METHODS) {
    const [theta, shape, friction] = [0, 1, 2].map((i) => String.fromCharCode(column.charCodeAt(0) + i));
    cells[`${column}${HEADING_ROW - 2}`] = `${label}: ${name}`;
    cells[`${column}${HEADING_ROW}`] = `=WALL.${name}(${from(source.x)},${from(source.ue)},${from(source.nu)},"columns = momentum_loss, shape, friction")`;
    [theta, shape, friction].forEach((c, i) => (cells[`${c}${HEADING_ROW - 1}`] = ["m", "–", "–"][i]!));
    formats[`${theta}${FIRST}:${theta}${last}`] = look.small;
    formats[`${shape}${FIRST}:${shape}${last}`] = look.ratio;
    formats[`${friction}${FIRST}:${friction}${last}`] = look.small;
  }
  const column = (letter: string, shift: number) => block(`${String.fromCharCode(letter.charCodeAt(0) + shift)}${FIRST}:${String.fromCharCode(letter.charCodeAt(0) + shift)}${last}`);
  const chart = (title: string, yLabel: string, shift: number, at: string, id: string) =>
    chartFigure({ title, x: block(`A${FIRST}:A${last}`), xLabel: "station x [m]", series: METHODS.map((m) => ({ label: m.label, values: column(m.column, shift) })), yLabel, at: block(at) }, id, CHART);
  return {
    id: "marches",
    name: SHEET,
    rowNumber: 200,
    colNumber: 30,
    cells,
    cols: Object.fromEntries([[0, 98], [1, 12], [5, 12], [9, 12], ...[2, 3, 4, 6, 7, 8, 10, 11, 12].map((c) => [c, 92])].map(([c, size]) => [c, { size }])),
    rows: { [HEADING_ROW - 1]: { size: 40 } },
    styles,
    formats,
    figures: [chart("Momentum loss by three methods", "momentum loss θ [m]", 0, "A4", "three-theta"), chart("Shape factor by three methods", "shape factor H", 1, "G4", "three-shape")],
  };
}

function block(address: string): CellBlock {
  return readAddress(address, SHEET)!;
}
