import { readFileSync } from "node:fs";
import path from "node:path";

/** A full solution of the laminar boundary-layer equations, from test/references/laminar_*.csv (nu = 1). */
export interface LaminarSolution {
  column: (name: string) => Float64Array;
  separation: number;
}

/** Reads one of the reference files; names: howarth_1mx, tani_1mx2, sin_x, hiemenz_poly. */
export function laminarSolution(name: string): LaminarSolution {
  const lines = readFileSync(path.join(__dirname, `../../references/laminar_${name}.csv`), "utf8").trim().split(/\r?\n/);
  const remarks = lines.filter((line) => line.startsWith("#")).join(" ");
  const [heads, ...rows] = lines.filter((line) => !line.startsWith("#")).map((line) => line.split(","));
  return {
    column: (wanted) => Float64Array.from(rows, (row) => Number(row[heads.indexOf(wanted)])),
    separation: Number(/x_s = ([0-9.]+)/.exec(remarks)?.[1]),
  };
}
