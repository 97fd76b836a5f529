import { axisWords, type Chart } from "./chart";
import { BESIDE, CHARACTER, ROW, SAMPLE, TEXT, type ChartLayout } from "./chart-layout";
import { chartSummary } from "./chart-summary";
import { linePath, lineRuns, markedPoints } from "./line-path";
import { seriesLook } from "./series-look";
import { svg, type SvgNode } from "./svg-node";

/** Colours on white paper; a page puts its own in their place by the class names (chart.css). */
const INK = "#1b2125";
const SOFT = "#545d63";
const RULE = "#cfd4d6";
const PAPER = "#ffffff";
/** Least distance of marks along a line. */
const MARKS_APART = 22;
const FACE = "system-ui, 'Segoe UI', 'Helvetica Neue', 'DejaVu Sans', 'Open Sans', sans-serif";

/**
 * Draws a chart as SVG. `id` begins the ids of its title and description and must be unlike any other on the page; with `paper` it
 * stands on white, as a file of its own should.
 */
export function chartSvg(chart: Chart, layout: ChartLayout, id: string, paper = false): SvgNode {
  const { width, height } = layout;
  return svg(
    "svg",
    { class: "wall-chart", width, height, viewBox: `0 0 ${width} ${height}`, role: "img", "aria-labelledby": `${id}-title ${id}-words`, "font-family": FACE, "font-size": TEXT, fill: INK },
    svg("title", { id: `${id}-title` }, chart.title),
    svg("desc", { id: `${id}-words` }, chartSummary(chart)),
    ...(paper ? [svg("rect", { width, height, fill: PAPER })] : []),
    ...layout.labelLines.map((words, i) => svg("text", { class: "wc-ink", x: 0, y: ROW * (i + 1) - 4, "font-weight": 600 }, words)),
    legend(layout),
    axes(chart, layout),
    markerLines(layout),
    ...chart.series.map((_, i) => seriesLine(chart, layout, i)),
  );
}

function legend(layout: ChartLayout): SvgNode {
  const top = layout.labelLines.length * ROW;
  const entries = layout.legend.map(({ words, px, row }, i) => {
    const y = top + row * ROW + ROW / 2;
    const look = seriesLook(i);
    return svg(
      "g",
      { class: `wc-s${i % 5}` },
      svg("path", { class: "wc-line", d: `M${px},${y}h${SAMPLE - 8}`, stroke: look.colour, "stroke-width": 1.5, "stroke-dasharray": look.dash || "none", fill: "none" }),
      mark(i, px + (SAMPLE - 8) / 2, y),
      svg("text", { class: "wc-ink", x: px + SAMPLE - 2, y: y + 4 }, words),
    );
  });
  return svg("g", {}, ...entries);
}

function axes(chart: Chart, { plot, x, y, height }: ChartLayout): SvgNode {
  const parts: SvgNode[] = [];
  for (const { value, words } of y.ticks) {
    const py = round(y.at(value));
    parts.push(svg("path", { class: "wc-rule", d: `M${plot.left},${py}H${plot.right}`, stroke: RULE, "stroke-width": 1 }));
    parts.push(svg("text", { class: "wc-soft", x: plot.left - 6, y: py + 4, "text-anchor": "end", fill: SOFT }, words));
  }
  // The last words of the x axis must not run out of the picture, and none into the next.
  let free = -Infinity;
  for (const { value, words } of x.ticks) {
    const px = round(x.at(value));
    parts.push(svg("path", { class: "wc-rule", d: `M${px},${plot.top}V${plot.bottom}`, stroke: RULE, "stroke-width": 1 }));
    parts.push(svg("path", { class: "wc-axis", d: `M${px},${plot.bottom}v4`, stroke: SOFT, "stroke-width": 1 }));
    const half = (words.length * CHARACTER) / 2;
    if (px - half < free) continue;
    free = px + half + 6;
    const atEnd = px + half > plot.right + 10;
    parts.push(svg("text", { class: "wc-soft", x: atEnd ? plot.right + 10 : px, y: plot.bottom + ROW, "text-anchor": atEnd ? "end" : "middle", fill: SOFT }, words));
  }
  parts.push(svg("path", { class: "wc-axis", d: `M${plot.left},${plot.top}V${plot.bottom}H${plot.right}`, stroke: SOFT, "stroke-width": 1, fill: "none" }));
  parts.push(svg("text", { class: "wc-soft", x: plot.right, y: height - 5, "text-anchor": "end", fill: SOFT }, axisWords(chart.x)));
  return svg("g", {}, ...parts);
}

function markerLines({ plot, markers, labelLines, legend: entries }: ChartLayout): SvgNode {
  const top = (labelLines.length + (entries.length > 0 ? entries.at(-1)!.row + 1 : 0)) * ROW;
  const lines = markers.map(({ px, row, side }) => {
    const x = round(px);
    const head = top + row * ROW + (side === "across" ? ROW : 2);
    return svg(
      "g",
      {},
      svg("path", { class: "wc-marker-line", d: `M${x},${head}V${plot.bottom}`, stroke: INK, "stroke-width": 1.5 }),
      svg("path", { class: "wc-ink", d: `M${x - 4},${plot.bottom}h8l-4,-7z`, fill: INK }),
    );
  });
  // Words last, each on a band of paper, so that a line behind them does not strike them out.
  const words = markers.map(({ words, row, side, from, to }) => {
    const x = round(side === "left" ? to - BESIDE : side === "right" ? from + BESIDE : from);
    return svg("text", { class: "wc-ink wc-over", x, y: top + row * ROW + 12, "text-anchor": side === "left" ? "end" : "start", stroke: PAPER, "stroke-width": 3, "stroke-linejoin": "round", "paint-order": "stroke" }, words);
  });
  return svg("g", {}, ...lines, ...words);
}

function seriesLine(chart: Chart, layout: ChartLayout, i: number): SvgNode {
  const look = seriesLook(i);
  const runs = lineRuns(chart.x.values, chart.series[i]!.values, layout.x, layout.y);
  return svg(
    "g",
    { class: `wc-s${i % 5}` },
    svg("path", { class: "wc-line", d: linePath(runs), stroke: look.colour, "stroke-width": 1.5, "stroke-dasharray": look.dash || "none", "stroke-linejoin": "round", fill: "none" }),
    ...markedPoints(runs, MARKS_APART).map((p) => mark(i, p.px, p.py)),
  );
}

function mark(i: number, px: number, py: number): SvgNode {
  const look = seriesLook(i);
  return svg("path", { class: look.hollow ? "wc-hollow" : "wc-mark", d: look.mark, transform: `translate(${round(px)},${round(py)})`, fill: look.hollow ? PAPER : look.colour, stroke: look.colour, "stroke-width": 1 });
}

function round(value: number): number {
  return Math.round(value * 100) / 100;
}
