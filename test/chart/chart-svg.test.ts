import { SaxesParser } from "saxes";
import type { Chart } from "../../src/chart/chart";
import { chartColumn } from "../../src/chart/chart-column";
import { chartLayout, nearestRow } from "../../src/chart/chart-layout";
import { chartSummary } from "../../src/chart/chart-summary";
import { chartSvg } from "../../src/chart/chart-svg";
import { seriesLook } from "../../src/chart/series-look";
import { svg, svgText } from "../../src/chart/svg-node";

const chart: Chart = {
  title: "Thicknesses along the wall",
  x: { label: "station x", unit: "m", scale: "linear", values: [0, 0.1, 0.2, 0.3, 0.4] },
  y: { label: "thickness", unit: "m", scale: "linear" },
  series: [
    { label: "momentum loss θ", values: [0.0001, 0.0002, 0.0003, 0.0004, null] },
    { label: "defect thickness δ*", values: [0.0003, 0.0002, 0.0009, null, null] },
  ],
  markers: [
    { x: 0.12, words: "onset 0.12" },
    { x: 0.35, words: "laminar separation 0.35" },
  ],
};
const drawn = (of: Chart, width = 296) => svgText(chartSvg(of, chartLayout(of, width, 120), "c"));

/** Elements of well-formed XML; throws where it is not. */
function elements(xml: string): { name: string; attributes: Record<string, string>; text: string }[] {
  const found: { name: string; attributes: Record<string, string>; text: string }[] = [];
  const parser = new SaxesParser();
  parser.on("error", (error) => {
    throw error;
  });
  parser.on("opentag", (tag) => found.push({ name: tag.name, attributes: tag.attributes as Record<string, string>, text: "" }));
  parser.on("text", (text) => (found.at(-1)!.text += text));
  parser.write(xml).close();
  return found;
}

test("a chart is well-formed XML with title, description, labels with units and the legend in words", () => {
  const all = elements(drawn(chart));
  const text = (name: string) => all.filter((e) => e.name === name).map((e) => e.text);
  expect(text("title")).toEqual(["Thicknesses along the wall"]);
  expect(text("desc")).toEqual([chartSummary(chart)]);
  for (const words of ["thickness [m]", "station x [m]", "momentum loss θ", "defect thickness δ*", "onset 0.12", "laminar separation 0.35", "0.0002", "0.0010"]) expect(text("text")).toContain(words);
  expect(all[0]!.attributes["aria-labelledby"]).toBe("c-title c-words");
});

test("words of a hostile cell are text in the picture, and characters XML has no place for are left out", () => {
  const hostile = { ...chart, title: `</title><script>alert(1)</script>&"\u0000\uD800` };
  const all = elements(drawn(hostile));
  expect(all.map((e) => e.name)).not.toContain("script");
  expect(all.find((e) => e.name === "title")!.text).toBe(`</title><script>alert(1)</script>&"`);
});

test("no two of the first ten lines have the same dashes and marks, so colour is never needed", () => {
  const looks = Array.from({ length: 10 }, (_, i) => seriesLook(i)).map((l) => `${l.dash}|${l.mark}|${l.hollow}`);
  expect(new Set(looks).size).toBe(10);
  expect(new Set(Array.from({ length: 5 }, (_, i) => seriesLook(i).mark)).size).toBe(5);
});

test("the summary names first, last, least and greatest values with their stations, the blanks and the markers", () => {
  const plainSpaces = (of: Chart) => chartSummary(of).replaceAll("\u00a0", " ");
  expect(plainSpaces(chart)).toBe(
    "Momentum loss θ: first 0.0001 m at station x 0 m, last 0.0004 m at station x 0.3 m, least 0.0001 m at station x 0 m, greatest 0.0004 m at station x 0.3 m; blank at 1 of 5 stations. " +
      "Defect thickness δ*: first 0.0003 m at station x 0 m, last 0.0009 m at station x 0.2 m, least 0.0002 m at station x 0.1 m, greatest 0.0009 m at station x 0.2 m; blank at 2 of 5 stations. " +
      "Onset 0.12. Laminar separation 0.35.",
  );
  expect(plainSpaces({ ...chart, series: [{ label: "cf", values: [null] }], markers: [{ x: 0.2, words: "onset" }] })).toBe("cf: no values. Onset at station x 0.2 m.");
  expect(chartSummary({ ...chart, y: { ...chart.y, scale: "log" }, series: [{ label: "cf", values: [1, 0, 1] }], markers: [] })).toContain("1 of 0 or less not drawn on the log axis");
});

test("words stay inside the picture and off each other at every width from 240 to 900 px", () => {
  const crowded = { ...chart, markers: [...chart.markers, { x: 0.13, words: "laminar separation 0.13" }, { x: 0.14, words: "reattachment 0.14" }] };
  for (let width = 240; width <= 900; width += 20) {
    const { markers, legend, plot } = chartLayout(crowded, width, 120);
    expect(markers).toHaveLength(4);
    for (const a of markers) {
      expect(a.from).toBeGreaterThanOrEqual(0);
      expect(a.to).toBeLessThanOrEqual(width);
      expect(a.to - a.from).toBeGreaterThanOrEqual(6.2 * a.words.length);
      for (const b of markers) {
        if (a !== b && a.row === b.row) expect(a.to <= b.from || b.to <= a.from).toBe(true);
      }
    }
    for (const entry of legend) expect(entry.px + 34 + 6.2 * entry.words.length).toBeLessThanOrEqual(width);
    expect(plot.bottom - plot.top).toBe(120);
  }
});

test("a marker outside the stations is told in words but not drawn", () => {
  const far = { ...chart, markers: [{ x: 9, words: "onset 9" }] };
  expect(chartLayout(far, 296, 120).markers).toEqual([]);
  expect(chartSummary(far)).toContain("Onset 9.");
});

test("the row under the pointer is the nearest station; blank stations are passed over", () => {
  const layout = chartLayout(chart, 296, 120);
  expect(nearestRow(layout, chart.x.values, layout.x.at(0.21))).toBe(2);
  expect(nearestRow(layout, [null, 0.1, null], 0)).toBe(1);
  expect(nearestRow(layout, [null], 0)).toBe(-1);
});

test("a chart without a value still draws its frame and says so", () => {
  const empty = { ...chart, series: [{ label: "cf", values: [null, null] }], markers: [] };
  expect(() => elements(drawn(empty))).not.toThrow();
  expect(drawn(empty)).not.toMatch(/NaN|Infinity|undefined/);
});

test("charts in one picture stand one below the other", () => {
  const one = svg("svg", { width: 100, height: 50 });
  const all = elements(svgText(chartColumn([one, one], 10)));
  expect(all[0]!.attributes).toMatchObject({ width: "120", height: "130", xmlns: "http://www.w3.org/2000/svg" });
  expect(all.slice(2).map((e) => e.attributes.y)).toEqual(["10", "70"]);
});
