import { canBeShown } from "../chart/axis-frame";
import { chartLayout, nearestRow, type ChartLayout } from "../chart/chart-layout";
import { chartSvg } from "../chart/chart-svg";
import { withUnit } from "../chart/chart-summary";
import { numberWords } from "../chart/number-words";
import { svg, svgElement } from "../chart/svg-node";
import { element } from "./element";
import type { LookPanel } from "./look-panels";
import type { LookTable } from "./look-table";

export interface LookCharts {
  readonly root: HTMLElement;
  show(table: LookTable, panels: readonly LookPanel[]): void;
}

/** Plot heights in pixels: one chart alone, and one of several. */
const ALONE = 200;
const AMONG = 100;
/** Charts are not drawn narrower than this. */
const LEAST_WIDTH = 240;

/** The charts one below the other with one station read off all of them: by a slider, or by the pointer over any chart. */
export function lookCharts(): LookCharts {
  const slider = element("input", { id: "wl-station", type: "range", min: "1", step: "1" });
  const place = element("p", { class: "wl-station-words" });
  const figures = element("div", { class: "wl-figures" });
  const root = element("div", {}, element("div", { class: "wl-reader" }, element("label", { for: "wl-station" }, "Station"), slider, place), figures);
  let table: LookTable | undefined;
  let panels: readonly LookPanel[] = [];
  let drawn: { layout: ChartLayout; panel: LookPanel; cursor: SVGElement; reading: HTMLElement }[] = [];
  let width = 0;

  function draw(): void {
    width = Math.max(LEAST_WIDTH, Math.floor(figures.clientWidth));
    drawn = panels.map((panel, i) => {
      const layout = chartLayout(panel.chart, width, panels.length > 1 ? AMONG : ALONE);
      const picture = svgElement(chartSvg(panel.chart, layout, `wl-chart-${i}`), document);
      const cursor = svgElement(svg("g", { class: "wl-cursor" }), document);
      const reading = element("p", { class: "wl-reading" });
      picture.append(cursor);
      const follow = (event: PointerEvent) => {
        const row = nearestRow(layout, panel.chart.x.values, event.clientX - picture.getBoundingClientRect().left);
        if (row >= 0) read(row);
      };
      picture.addEventListener("pointermove", follow);
      picture.addEventListener("pointerdown", follow);
      return { layout, panel, cursor, reading, figure: element("figure", { class: "wl-figure" }, picture, reading) };
    }).map(({ figure, ...rest }, i) => {
      if (i === 0) figures.replaceChildren();
      figures.append(figure);
      return rest;
    });
    read(Number(slider.value) - 1);
  }

  function read(row: number): void {
    if (!table) return;
    slider.value = String(row + 1);
    const x = table.x.values[row];
    const where = x === null || x === undefined ? "blank station" : `${table.x.heading} ${withUnit(numberWords(x), table.x.unit)}`;
    const state = table.states[row] ? `, ${table.states[row]}` : "";
    place.textContent = `${where}, row ${row + 1} of ${table.rows}${state}`;
    const said: string[] = [];
    for (const { layout, panel, cursor, reading } of drawn) {
      const { chart } = panel;
      const words = chart.series.map(({ label, values }) => `${label} ${canBeShown(values[row], "linear") ? withUnit(numberWords(values[row]), chart.y.unit) : "blank"}`);
      said.push(...words);
      reading.replaceChildren(...words.map((text) => element("span", {}, text)));
      cursor.replaceChildren();
      if (!canBeShown(x, chart.x.scale)) continue;
      const px = layout.x.at(x);
      cursor.append(svgElement(svg("path", { d: `M${px},${layout.plot.top}V${layout.plot.bottom}` }), document));
      for (const { values } of chart.series) {
        const y = values[row];
        if (canBeShown(y, chart.y.scale)) cursor.append(svgElement(svg("circle", { cx: px, cy: layout.y.at(y), r: 6 }), document));
      }
    }
    slider.setAttribute("aria-valuetext", `${place.textContent}: ${said.join("; ")}`);
  }

  slider.addEventListener("input", () => read(Number(slider.value) - 1));
  new ResizeObserver(() => {
    if (drawn.length > 0 && Math.abs(Math.floor(figures.clientWidth) - width) >= 1 && figures.clientWidth >= LEAST_WIDTH) draw();
  }).observe(figures);

  return {
    root,
    show(next, chosen) {
      slider.max = String(next.rows);
      // A table of another length is another table: begin at its first station.
      if (table?.rows !== next.rows) slider.value = "1";
      [table, panels] = [next, chosen];
      draw();
    },
  };
}
