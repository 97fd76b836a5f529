import { edgeCurve, type EdgeFit } from "../../physics/edge/edge-curve";
import { radiusCurve } from "../../physics/edge/radius-curve";
import { wallConditions, type WallConditions } from "../../physics/laminar/wall-conditions";
import { cellError } from "../errors/cell-error";
import { refusalError } from "../errors/sentences";
import type { Call } from "../reading/call";
import { readColumn, readOptionalColumn } from "../reading/read-column";
import type { Options } from "../reading/read-options";
import { readNumber } from "../reading/read-value";

/** The wall arguments of a march as they arrive from the sheet. */
export interface WallArguments {
  x: unknown;
  ue: unknown;
  nu: unknown;
  radius: unknown;
  wall_velocity: unknown;
}

/** What a march needs of its wall, read and made into curves. */
export interface ReadWall {
  wall: WallConditions;
  nu: number;
  /** Words for the note: "plane wall", "round body with flow through the wall", … */
  words: string;
}

/** Reads stations, edge speed, viscosity, radius and wall velocity, and makes the curves as `edge fit` and `noise` say. */
export function readWall(call: Call, given: WallArguments, options: Options): ReadWall {
  const stations = readColumn(call, "x", given.x, { least: 2, rising: true });
  const speeds = readColumn(call, "ue", given.ue, { length: stations.length });
  const nu = readNumber(call, "nu", given.nu, { positive: true });
  const radii = readOptionalColumn(call, "radius", given.radius, { length: stations.length, notNegative: true });
  const wallVelocity = readOptionalColumn(call, "wall_velocity", given.wall_velocity, { length: stations.length });
  const fit = (options.word("edge fit") ?? "spline") as EdgeFit;
  const noise = options.number("noise");
  if (fit !== "smooth" && (noise !== undefined || options.word("noise") !== undefined)) {
    throw cellError("#VALUE!", `${call.name} needs edge fit = smooth where the option noise is given; it has ${fit}`);
  }
  const edge = edgeCurve(stations, speeds, { fit, noise });
  if (!edge.ok) throw refusalError(call, edge);
  const round = radii === undefined ? undefined : radiusCurve(stations, radii);
  if (round && !round.ok) throw refusalError(call, round);
  const made = wallConditions(edge.edge, { radius: round?.curve, wallVelocity });
  if (!made.ok) throw refusalError(call, made);
  return { wall: made.wall, nu, words: `${round ? "round body" : "plane wall"}${made.wall.wallVelocity ? " with flow through it" : ""}` };
}
