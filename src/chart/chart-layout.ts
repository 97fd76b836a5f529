import { axisFrame, canBeShown, type AxisFrame } from "./axis-frame";
import { axisWords, type Chart, type ChartMarker } from "./chart";

/** Sizes in pixels. */
export const TEXT = 11;
/** Mean width of a character of that size in the usual sans serif faces, a little on the safe side. */
export const CHARACTER = 6.2;
export const ROW = 16;
const SIDE = 12;
const TICK_LENGTH = 4;
/** Room one mark of an axis wants. */
const X_TICK = 64;
const Y_TICK = 30;
/** A line sample of the legend, with the space behind it. */
export const SAMPLE = 34;

/** Distance of a marker's words from its line. */
export const BESIDE = 5;

export interface PlacedWords {
  readonly words: string;
  readonly px: number;
  readonly row: number;
}

export interface PlacedMarker extends PlacedWords {
  readonly x: number;
  /** Where the words stand beside the line; across it where neither side has room. */
  readonly side: "right" | "left" | "across";
  /** The words' box, with its distance from the line. */
  readonly from: number;
  readonly to: number;
}

export interface ChartLayout {
  readonly width: number;
  readonly height: number;
  readonly plot: { readonly left: number; readonly top: number; readonly right: number; readonly bottom: number };
  readonly x: AxisFrame;
  readonly y: AxisFrame;
  /** Baselines count down from the y label, which is line 0. */
  readonly labelLines: readonly string[];
  readonly legend: readonly PlacedWords[];
  readonly markers: readonly PlacedMarker[];
}

/** Places everything of a chart `width` pixels wide around a plot `plotHeight` high: words above it, marks of the axes beside and below. */
export function chartLayout(chart: Chart, width: number, plotHeight: number): ChartLayout {
  const labelLines = wrapped(axisWords(chart.y), Math.floor((width - SIDE) / (CHARACTER * 1.05)));
  const legend = chart.series.length > 1 ? flow(chart.series.map((s) => s.label), width) : [];
  const legendRows = legend.length > 0 ? legend.at(-1)!.row + 1 : 0;
  const yValues = chart.series.flatMap((s) => s.values.filter((_, i) => canBeShown(chart.x.values[i], chart.x.scale)));
  // How wide the marks' words are is settled by a first look at the values; the plot's height comes after.
  const first = axisFrame(yValues, chart.y.scale, [1, 0], 4);
  const left = Math.ceil(Math.max(...first.ticks.map((t) => t.words.length), 1) * CHARACTER) + TICK_LENGTH + 6;
  const x = axisFrame(chart.x.values, chart.x.scale, [left, width - SIDE], Math.max(2, Math.floor((width - left - SIDE) / X_TICK)), true);
  const markers = placeMarkers(chart.markers, x, width);
  const markerRows = markers.reduce((most, m) => Math.max(most, m.row + 1), 0);
  const top = (labelLines.length + legendRows + markerRows) * ROW + 8;
  const bottom = top + plotHeight;
  const y = axisFrame(yValues, chart.y.scale, [bottom, top], Math.max(2, Math.floor(plotHeight / Y_TICK)));
  return { width, height: bottom + 2 * ROW + 6, plot: { left, top, right: width - SIDE, bottom }, x, y, labelLines, legend, markers };
}

/** The row nearest to a pixel among those with a place on the x axis; −1 if there is none. */
export function nearestRow(layout: ChartLayout, values: readonly (number | null)[], px: number): number {
  let nearest = -1;
  let least = Infinity;
  values.forEach((value, i) => {
    if (!canBeShown(value, layout.x.scale)) return;
    const distance = Math.abs(layout.x.at(value) - px);
    if (distance < least) [nearest, least] = [i, distance];
  });
  return nearest;
}

/** Each marker's words beside the head of its line, in the first row where they meet no other words and, where that can be had, no other line. */
function placeMarkers(markers: readonly ChartMarker[], x: AxisFrame, width: number): PlacedMarker[] {
  const boxes = markers
    .filter((m) => canBeShown(m.x, x.scale) && m.x >= x.from && m.x <= x.to)
    .map((m) => {
      const px = x.at(m.x);
      const long = m.words.length * CHARACTER + BESIDE;
      const side = px + long <= width ? ("right" as const) : px >= long ? ("left" as const) : ("across" as const);
      const from = side === "right" ? px : side === "left" ? px - long : Math.max(0, width - long);
      return { words: m.words, px, side, x: m.x, from, to: from + long };
    })
    // Lines run down from their words: nearest to its own edge first, so that the next words stand clear of them.
    .sort((a, b) => Number(a.side === "left") - Number(b.side === "left") || (a.side === "left" ? b.px - a.px : a.px - b.px));
  const placed: PlacedMarker[] = [];
  for (const box of boxes) {
    const rows = Array.from({ length: placed.length + 1 }, (_, row) => row).filter((row) => !placed.some((p) => p.row === row && p.from < box.to && box.from < p.to));
    const clear = rows.find((row) => !placed.some((p) => (p.row < row && p.px > box.from && p.px < box.to) || (p.row > row && box.px > p.from && box.px < p.to)));
    placed.push({ ...box, row: clear ?? rows[0]! });
  }
  return placed;
}

/** Places words one after another in rows. */
function flow(words: readonly string[], width: number): PlacedWords[] {
  let [px, row] = [0, 0];
  return words.map((text) => {
    const long = SAMPLE + text.length * CHARACTER + 12;
    if (px > 0 && px + long > width) [px, row] = [0, row + 1];
    const placed = { words: text, px, row };
    px += long;
    return placed;
  });
}

function wrapped(text: string, most: number): string[] {
  const lines = [""];
  for (const word of text.split(" ")) {
    const longer = lines.at(-1) === "" ? word : `${lines.at(-1)} ${word}`;
    if (longer.length <= most || lines.at(-1) === "") lines[lines.length - 1] = longer;
    else lines.push(word);
  }
  return lines;
}
