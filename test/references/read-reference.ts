import { readFileSync } from "node:fs";
import path from "node:path";

/** Rows of a reference file by column name; lines that begin with # are its source notes. */
export function readReference(name: string): Record<string, string>[] {
  const lines = readFileSync(path.join(__dirname, name), "utf8").trim().split(/\r?\n/).filter((line) => !line.startsWith("#"));
  const heads = lines[0]!.split(",");
  return lines.slice(1).map((line) => Object.fromEntries(line.split(",").map((cell, i) => [heads[i]!, cell])));
}

/** One column of rows as numbers. */
export function numbers(rows: readonly Record<string, string>[], column: string): Float64Array {
  return Float64Array.from(rows, (row) => Number(row[column]));
}
