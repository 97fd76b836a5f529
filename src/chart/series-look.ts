import { symbol, symbolCircle, symbolDiamond, symbolSquare, symbolStar, symbolTriangle, type SymbolType } from "d3-shape";

/** What tells one line from the others: dashes and the shape of its marks first, colour only besides. */
export interface SeriesLook {
  /** stroke-dasharray; empty for an unbroken line. */
  readonly dash: string;
  /** SVG path of a mark around 0, 0. */
  readonly mark: string;
  readonly hollow: boolean;
  /** On white paper; pages put their own in its place (chart.css). */
  readonly colour: string;
}

/** Area of a mark in square pixels. */
const MARK_AREA = 30;
const SHAPES: readonly SymbolType[] = [symbolCircle, symbolSquare, symbolTriangle, symbolDiamond, symbolStar];
const DASHES = ["", "6 3", "2 3", "9 3 2 3", "12 4"];
/** Dark enough for 4.5 : 1 on white: a blue, an ochre, a green, a violet, a slate. */
const COLOURS = ["#1f6f8b", "#9a5417", "#4a7433", "#7a4d8f", "#4d5960"];

/** Looks that differ without colour; past five, marks turn hollow and go on. */
export function seriesLook(i: number): SeriesLook {
  const n = SHAPES.length;
  const round = Math.floor(i / n);
  return { dash: DASHES[(i + round) % n]!, mark: symbol(SHAPES[i % n]!, MARK_AREA).digits(2)()!, hollow: round % 2 === 1, colour: COLOURS[i % n]! };
}
