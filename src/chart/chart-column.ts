import { svg, type SvgNode } from "./svg-node";

/** Several drawn charts one below the other as one picture on white, with `gap` pixels between and around them. */
export function chartColumn(charts: readonly SvgNode[], gap = 12): SvgNode {
  let y = gap;
  const width = Math.max(...charts.map((c) => Number(c.attributes.width))) + 2 * gap;
  const placed = charts.map((chart) => {
    const at = { ...chart, attributes: { ...chart.attributes, x: gap, y } };
    y += Number(chart.attributes.height) + gap;
    return at;
  });
  const height = y;
  return svg("svg", { width, height, viewBox: `0 0 ${width} ${height}` }, svg("rect", { width, height, fill: "#ffffff" }), ...placed);
}
