import { blockAddress } from "../pane/cell-block";
import type { ChartRequest } from "../pane/sheet-host";

/** A chart as the grid's book data hold it (@odoo/o-spreadsheet 19.3.7, data version 19.3.2). */
export interface ChartFigure {
  readonly id: string;
  readonly tag: "chart";
  readonly col: number;
  readonly row: number;
  readonly offset: { readonly x: number; readonly y: number };
  readonly width: number;
  readonly height: number;
  readonly data: Readonly<Record<string, unknown>> & { readonly chartId: string };
}

/** Lines told apart on paper white and on slate: a blue, an ochre, a green, a violet, of similar weight. */
const LINE_COLOURS = ["#1f6f8b", "#b5651d", "#4d7c3a", "#7a4d8f"];
const WIDTH = 400;
const HEIGHT = 260;

/** A line chart with marks over a numeric x axis. */
export function chartFigure(chart: ChartRequest, id: string, size = { width: WIDTH, height: HEIGHT }): ChartFigure {
  return {
    id,
    tag: "chart",
    col: chart.at.left,
    row: chart.at.top,
    offset: { x: 0, y: 0 },
    ...size,
    data: {
      chartId: id,
      type: "line",
      title: { text: chart.title, fontSize: 13 },
      dataSource: {
        type: "range",
        dataSets: chart.series.map((series, i) => ({ dataSetId: String(i), dataRange: blockAddress(series.values) })),
        dataSetsHaveTitle: false,
        labelRange: blockAddress(chart.x),
      },
      dataSetStyles: Object.fromEntries(chart.series.map((series, i) => [String(i), { label: series.label, backgroundColor: LINE_COLOURS[i % LINE_COLOURS.length] }])),
      legendPosition: chart.series.length > 1 ? "top" : "none",
      labelsAsText: false,
      stacked: false,
      cumulative: false,
      aggregated: false,
      humanize: false,
      axesDesign: { x: { title: { text: chart.xLabel, fontSize: 12 } }, y: { title: { text: chart.yLabel, fontSize: 12 } } },
    },
  };
}
