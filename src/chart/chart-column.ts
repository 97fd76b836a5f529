import { svg, type SvgNode } from "./svg-node";

/** Several drawn charts one below the other as one picture. */
export function chartColumn(charts: readonly SvgNode[], gap = 12): SvgNode {
  let y = 0;
  const width = Math.max(...charts.map((c) => Number(c.attributes.width)));
  const placed = charts.map((chart) => {
    const at = { ...chart, attributes: { ...chart.attributes, y } };
    y += Number(chart.attributes.height) + gap;
    return at;
  });
  const height = Math.max(0, y - gap);
  return svg("svg", { width, height, viewBox: `0 0 ${width} ${height}` }, svg("rect", { width, height, fill: "#ffffff" }), ...placed);
}
