import type { ChartRequest } from "../pane/sheet-host";
import { rangeOf } from "./range-of";

/** Size of a new chart in points: four standard columns by fifteen rows and a bit. */
const WIDTH = 420;
const HEIGHT = 260;

/** Inserts a native chart: one scatter series with straight lines for each column, over one x column, axes titled. */
export async function excelChart(context: Excel.RequestContext, request: ChartRequest): Promise<void> {
  const sheet = context.workbook.worksheets.getItem(request.at.sheet);
  const x = rangeOf(context, request.x);
  const chart = sheet.charts.add(Excel.ChartType.xyscatterLinesNoMarkers, rangeOf(context, request.series[0]?.values ?? request.x), Excel.ChartSeriesBy.columns);
  chart.title.text = request.title;
  chart.axes.categoryAxis.title.text = request.xLabel;
  chart.axes.valueAxis.title.text = request.yLabel;
  request.series.forEach((series, i) => {
    const line = i === 0 ? chart.series.getItemAt(0) : chart.series.add(series.label);
    line.name = series.label;
    line.setValues(rangeOf(context, series.values));
    line.setXAxisValues(x);
  });
  chart.setPosition(rangeOf(context, { ...request.at, right: request.at.left, bottom: request.at.top }));
  chart.width = WIDTH;
  chart.height = HEIGHT;
  await context.sync();
}
