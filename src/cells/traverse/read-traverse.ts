import { traverseIntegrals, type Traverse, type TraverseSettings } from "../../physics/traverse/traverse-integrals";
import type { NearWallChoice } from "../../physics/traverse/near-wall";
import { cellError } from "../errors/cell-error";
import { refusalError } from "../errors/sentences";
import type { Call } from "../reading/call";
import { cellRows, describeCell } from "../reading/cell-value";
import { readColumn, readOptionalColumn } from "../reading/read-column";
import { readOptionalNumber, single } from "../reading/read-value";

/** The ranges of a traverse function as they arrive. */
export interface TraverseRanges {
  y: unknown;
  u: unknown;
  edge?: unknown;
  density?: unknown;
  wall?: unknown;
  nu?: unknown;
}

/** Reads the ranges every traverse function shares and integrates the profile. */
export function readTraverse(call: Call, ranges: TraverseRanges, nearWall?: NearWallChoice): Traverse {
  const y = readColumn(call, "y", ranges.y, { least: 3, rising: true, notNegative: true });
  const u = readColumn(call, "u", ranges.u, { length: y.length });
  const settings: TraverseSettings = {
    edge: readEdge(call, ranges.edge, y.length),
    density: readOptionalColumn(call, "density", ranges.density, { length: y.length, positive: true }),
    radius: readWall(call, ranges.wall),
    nu: readOptionalNumber(call, "nu", ranges.nu, { positive: true }),
    nearWall,
  };
  const made = traverseIntegrals(y, u, settings);
  if (!made.ok) throw refusalError(call, made);
  return made.traverse;
}

/** One cell is the edge speed, a column the inviscid speed at each y, nothing means that it is found. */
export function readEdge(call: Call, raw: unknown, length: number): number | Float64Array | undefined {
  const rows = cellRows(raw);
  if (rows === undefined) return undefined;
  if (rows.length === 1 && rows[0]!.length === 1) return readOptionalNumber(call, "edge", raw, { positive: true });
  return readOptionalColumn(call, "edge", raw, { length, positive: true });
}

/** "plane" or nothing, or the radius of a round wall. */
function readWall(call: Call, raw: unknown): number | undefined {
  const cell = single(call, "wall", raw);
  if (cell.kind === "blank" || (cell.kind === "text" && cell.value.trim().toLowerCase() === "plane")) return undefined;
  if (cell.kind === "number" && Number.isFinite(cell.value) && cell.value !== 0) return cell.value;
  throw cellError("#VALUE!", `${call.name} needs wall as plane or as the radius of a round wall, not 0; it ${describeCell(cell)}`);
}
