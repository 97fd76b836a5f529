import { cellError } from "../errors/cell-error";
import type { Call } from "../reading/call";
import { HEADINGS, type HeadingKey } from "./headings";

/** What a cell function may put into a cell. */
export type Cell = number | string | boolean;

/** One column of a table to spill. */
export interface TableColumn {
  key: HeadingKey;
  /** One entry a row; text columns hold text. */
  values: ArrayLike<number | string>;
  /** 1 where the cell stays empty; entries past the end of `values` are empty too. */
  blank?: ArrayLike<number>;
}

/**
 * Spills a heading row and `rows` rows in the fixed order of the vocabulary, or in the order of the `columns` option.
 * Empty places hold "". A number that is not finite and not marked blank is a fault of ours and is refused loudly.
 */
export function spillTable(call: Call, rows: number, columns: readonly TableColumn[], wanted?: readonly string[]): Cell[][] {
  const chosen = wanted === undefined ? inFixedOrder(columns) : wanted.map((key) => columnFor(call, columns, key));
  const table: Cell[][] = new Array<Cell[]>(rows + 1);
  table[0] = chosen.map((column) => HEADINGS.find((h) => h.key === column.key)!.heading);
  for (let i = 0; i < rows; i++) {
    const row = new Array<Cell>(chosen.length);
    for (let c = 0; c < chosen.length; c++) row[c] = cellOf(chosen[c]!, i);
    table[i + 1] = row;
  }
  return table;
}

/** Spills a bare column of numbers, aligned with the input's rows. */
export function spillColumn(values: Float64Array): Cell[][] {
  const out = new Array<Cell[]>(values.length);
  for (let i = 0; i < values.length; i++) out[i] = [finite(values[i]!, "column", i)];
  return out;
}

function inFixedOrder(columns: readonly TableColumn[]): TableColumn[] {
  const order = new Map<string, number>(HEADINGS.map((h, i) => [h.key, i]));
  return [...columns].sort((a, b) => order.get(a.key)! - order.get(b.key)!);
}

function columnFor(call: Call, columns: readonly TableColumn[], key: string): TableColumn {
  const column = columns.find((c) => c.key === key);
  if (column) return column;
  throw cellError("#VALUE!", `${call.name} needs columns it gives; it has no ${key}, only ${columns.map((c) => c.key).join(", ")}`);
}

function cellOf(column: TableColumn, i: number): Cell {
  if (i >= column.values.length || (column.blank?.[i] ?? 0) !== 0) return "";
  const value = column.values[i]!;
  return typeof value === "number" ? finite(value, column.key, i) : value;
}

function finite(value: number, what: string, i: number): number {
  if (Number.isFinite(value)) return value;
  throw new Error(`a number that is not finite reached ${what}, row ${i + 1}`);
}
