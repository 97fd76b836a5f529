import { tickWords } from "../chart/number-words";
import { seriesLook } from "../chart/series-look";

/** The parts of the grid's drawing library (chart.js 4.5.0) that are touched here. */
interface GridChart {
  readonly config: { readonly options?: { readonly scales?: Readonly<Record<string, GridScale | undefined>> } };
  readonly data: { readonly datasets: { type?: string; borderDash?: number[]; pointStyle?: string; pointRadius?: number }[] };
  readonly legend?: { readonly legendItems?: { datasetIndex?: number; lineDash?: number[] }[] };
}
interface GridScale {
  ticks?: { callback?: TickCallback & { isOurs?: true } };
}
type TickCallback = (this: unknown, value: number | string, index: number, ticks: readonly { readonly value: number }[]) => unknown;

/** The library's names for the shapes of our own charts, in the same order. */
const SHAPES = ["circle", "rect", "triangle", "rectRot", "star"];
const RADIUS = 3;
/** Only in these do lines and points mean a series. */
const LINES = ["line", "scatter"];

/**
 * Gives the lines of the grid's own charts the dashes and mark shapes of our charts, so that they are told apart without colour, and
 * their axes plain numbers in place of exponents. Sheet charts stay the grid's: they follow the cells and are kept in .xlsx files.
 */
export function chartMarks(library: { register(plugin: object): void }): void {
  library.register({
    id: "wallsheet-marks",
    beforeUpdate(chart: GridChart & { readonly config: { readonly type?: string } }) {
      if (!LINES.includes(chart.config.type ?? "")) return;
      chart.data.datasets.forEach((line, i) => {
        line.borderDash = dash(i);
        line.pointStyle = SHAPES[i % SHAPES.length];
        line.pointRadius = RADIUS;
      });
      for (const scale of Object.values(chart.config.options?.scales ?? {})) {
        const before = scale?.ticks?.callback;
        if (before && !before.isOurs) scale.ticks!.callback = Object.assign(plainTicks(before), { isOurs: true as const });
      }
    },
    beforeDraw(chart: GridChart) {
      for (const item of chart.legend?.legendItems ?? []) if (item.datasetIndex !== undefined) item.lineDash = chart.data.datasets[item.datasetIndex]?.borderDash;
    },
  });
}

function dash(i: number): number[] {
  const { dash: written } = seriesLook(i);
  return written === "" ? [] : written.split(" ").map(Number);
}

/** The marks as the sheet's number format gives them, unless that writes exponents. */
function plainTicks(before: TickCallback): TickCallback {
  return function (value, index, ticks) {
    const words = before.call(this, value, index, ticks);
    if (typeof words !== "string" || !/\de[+-]?\d/i.test(words)) return words;
    const values = ticks.map((tick) => tick.value);
    const step = values.length > 1 ? Number(Math.abs(values[1]! - values[0]!).toPrecision(6)) : Math.abs(values[0] ?? 1);
    return tickWords(values, step)[index];
  };
}
