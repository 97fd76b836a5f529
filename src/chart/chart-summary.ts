import { canBeShown } from "./axis-frame";
import type { Chart, ChartAxis, ChartSeries } from "./chart";
import { numberWords } from "./number-words";

/** A chart in words: for each line its first, last, least and greatest value with their stations and its blanks; then the markers. */
export function chartSummary(chart: Chart): string {
  const lines = chart.series.map((series) => seriesWords(chart, series));
  const markers = chart.markers.map((m) => `${capital(m.words)}${saysPlace(m.words, m.x) ? "" : ` at ${place(chart.x, m.x)}`}.`);
  return [...lines, ...markers].join(" ");
}

/** One line in words. */
export function seriesWords(chart: Chart, series: ChartSeries): string {
  const rows = chart.x.values.flatMap((x, i) => (canBeShown(x, "linear") && canBeShown(series.values[i], "linear") ? [{ x, y: series.values[i] as number }] : []));
  const name = capital(series.label);
  if (rows.length === 0) return `${name}: no values.`;
  const [first, last] = [rows[0]!, rows.at(-1)!];
  const least = rows.reduce((a, b) => (b.y < a.y ? b : a));
  const greatest = rows.reduce((a, b) => (b.y > a.y ? b : a));
  const at = (row: { x: number; y: number }) => `${withUnit(numberWords(row.y), chart.y.unit)} at ${place(chart.x, row.x)}`;
  const range = least.y === greatest.y ? "the same at every station" : `least ${at(least)}, greatest ${at(greatest)}`;
  const blanks = chart.x.values.length - rows.length;
  const unseen = rows.filter(({ x, y }) => !canBeShown(x, chart.x.scale) || !canBeShown(y, chart.y.scale)).length;
  return [
    `${name}: first ${at(first)}, last ${at(last)}, ${range}`,
    ...(blanks > 0 ? [`blank at ${blanks} of ${chart.x.values.length} stations`] : []),
    ...(unseen > 0 ? [`${unseen} of 0 or less not drawn on the log axis`] : []),
  ].join("; ") + ".";
}

function place(x: ChartAxis, value: number): string {
  return `${x.label} ${withUnit(numberWords(value), x.unit)}`;
}

/** A number with its unit behind it, never parted by the end of a line; a pure number alone. */
export function withUnit(number: string, unit: string): string {
  return unit === "" || unit === "1" ? number : `${number}\u00a0${unit}`;
}

function saysPlace(words: string, x: number): boolean {
  return words.includes(numberWords(x));
}

/** First letter large, unless it is a symbol such as θ or cf. */
function capital(text: string): string {
  return /^[a-z]{3}/.test(text) ? text[0]!.toUpperCase() + text.slice(1) : text;
}
