import { axisWords, type ChartMarker } from "../chart/chart";
import { findHeading } from "../cells/writing/headings";
import { columnUnits } from "./column-units";
import { layerMarkers } from "./layer-markers";
import type { HostCell } from "./sheet-host";

export interface LookColumn {
  /** Key of the heading vocabulary, where the heading is one of its words. */
  readonly key: string | undefined;
  readonly heading: string;
  readonly unit: string;
  /** Kind of quantity, for labels where the unit is not known. */
  readonly kind: string;
  /** Blank is null. */
  readonly values: readonly (number | null)[];
}

/** A table that can be drawn: columns of numbers over stations. */
export interface LookTable {
  readonly x: LookColumn;
  readonly columns: readonly LookColumn[];
  readonly rows: number;
  /** A word a row; empty where the table has no state. */
  readonly states: readonly string[];
  /** What the table says besides its numbers, with the row (from 1) it stands in. */
  readonly notes: readonly { readonly row: number; readonly words: string }[];
  readonly markers: readonly ChartMarker[];
  /** Headings and cells as spilled, for a file. */
  readonly headings: readonly string[];
  readonly cells: readonly (readonly HostCell["value"][])[];
}

/** Columns that say where a row lies, best first. */
const PLACES = ["station", "height", "similar_height"];
const WORDS = ["state", "note"];

/**
 * Reads a spilled block. `above` are the texts of the cells over its first row (units of a table, heading of a bare column);
 * `stations` the numbers of the formula's first argument where they could be read. Undefined where there is nothing to draw: a single
 * value, or a list of results with their names.
 */
export function lookTable(block: readonly (readonly HostCell[])[], above: readonly string[], stations: readonly number[] | undefined): LookTable | undefined {
  const width = block[0]?.length ?? 0;
  const hasHeadings = width > 0 && block[0]!.every((cell) => typeof cell.value === "string" && cell.value !== "");
  const rows = hasHeadings ? block.slice(1) : [...block];
  if (width === 0 || rows.length < 2) return undefined;
  const read = Array.from({ length: width }, (_, c) => {
    const values = rows.map((row) => row[c]?.value ?? null);
    const heading = hasHeadings ? String(block[0]![c]!.value) : bareHeading(above[c], c, width);
    return { key: findHeading(heading)?.key as string | undefined, heading, values, isNumeric: values.some((v) => typeof v === "number") && values.every((v) => v === null || v === "" || typeof v === "number") };
  });
  // A column of names in front makes it a list of results, not a table over stations.
  if (!read.some((c) => c.isNumeric) || (!read[0]!.isNumeric && !WORDS.includes(read[0]!.key ?? "") && read[0]!.values.some((v) => typeof v === "string" && v !== ""))) return undefined;
  const units = columnUnits(read, hasHeadings ? above : []);
  const numeric = read.flatMap((c, i) => (c.isNumeric ? [{ key: c.key, heading: c.heading, ...units[i]!, values: c.values.map((v) => (typeof v === "number" ? v : null)) }] : []));
  const x = stationsOf(numeric, rows.length, stations);
  const columns = numeric.filter((c) => c !== x);
  if (columns.length === 0) return undefined;
  const texts = (key: string) => read.find((c) => c.key === key && !c.isNumeric)?.values.map((v) => (typeof v === "string" ? v : "")) ?? [];
  const states = texts("state");
  const notes = texts("note").flatMap((words, i) => (words === "" ? [] : [{ row: i + 1, words }]));
  return { x, columns, rows: rows.length, states, notes, markers: layerMarkers(x, states, notes), headings: read.map((c, i) => axisWords({ label: c.heading, unit: units[i]!.unit })), cells: rows.map((row) => Array.from({ length: width }, (_, c) => row[c]?.value ?? null)) };
}

function stationsOf(columns: readonly LookColumn[], rows: number, stations: readonly number[] | undefined): LookColumn {
  const named = PLACES.map((key) => columns.find((c) => c.key === key)).find((c) => c !== undefined);
  if (named) return named;
  if (stations?.length === rows) return { key: "station", heading: "station x", unit: "", kind: "length", values: stations };
  const first = columns[0]!;
  if (columns.length > 1 && first.values.every((v, i) => v !== null && (i === 0 || v > first.values[i - 1]!))) return first;
  return { key: undefined, heading: "row of the table", unit: "1", kind: "", values: Array.from({ length: rows }, (_, i) => i + 1) };
}

function bareHeading(above: string | undefined, column: number, width: number): string {
  if (above !== undefined && above.trim() !== "" && !Number.isFinite(Number(above))) return above.trim();
  return width === 1 ? "value" : `column ${column + 1}`;
}
