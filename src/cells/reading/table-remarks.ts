import { findHeading } from "../writing/headings";
import { cellRows, cellValue } from "./cell-value";

/** State words of stations at which a method says nothing (any more). */
const BEYOND = new Set(["separated", "out of range", "lifted off", "no solution"]);

/** What a spilled table says about itself. */
export interface TableRemarks {
  /** The note column's texts, each with its station: `at 0.5: laminar separation …`. */
  notes: string[];
  /** Where the method's range ends, from the state column: `separated in rows 9 to 16, from station x 0.05`. */
  beyond: string[];
}

/** Reads state and note of a table with a heading row, as a sheet holds it; nothing to say of any other block. */
export function tableRemarks(table: readonly (readonly unknown[])[]): TableRemarks {
  const rows = cellRows(table) ?? [];
  const text = (cell: unknown) => {
    const value = cellValue(cell);
    return value.kind === "text" ? value.value : "";
  };
  const keys = (rows[0] ?? []).map((cell) => findHeading(text(cell))?.key);
  const column = (key: string) => keys.indexOf(key);
  const station = (row: readonly unknown[]) => {
    const value = column("station") < 0 ? undefined : cellValue(row[column("station")]);
    return value?.kind === "number" ? String(Number(value.value.toPrecision(6))) : undefined;
  };
  const data = rows.slice(1);
  const notes = data.flatMap((row) => {
    const note = column("note") < 0 ? "" : text(row[column("note")]);
    const at = station(row);
    return note === "" ? [] : [at === undefined ? note : `at ${at}: ${note}`];
  });
  const beyond: string[] = [];
  for (let from = 0; column("state") >= 0 && from < data.length; ) {
    const state = text(data[from]![column("state")]);
    let to = from;
    while (to + 1 < data.length && text(data[to + 1]![column("state")]) === state) to++;
    const at = station(data[from]!);
    if (BEYOND.has(state)) beyond.push(`${state} in ${from === to ? `row ${from + 2}` : `rows ${from + 2} to ${to + 2}`} of its block${at === undefined ? "" : `, from station x ${at}`}`);
    from = to + 1;
  }
  return { notes, beyond };
}
