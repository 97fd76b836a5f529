import { similarLayer as solveSimilar, type SimilarLayer } from "../../physics/laminar/similar-layer";
import { refusalError } from "../errors/sentences";
import { openCall } from "../reading/call";
import { readOptionalChoice } from "../reading/read-choice";
import { readNumber, readOptionalNumber } from "../reading/read-value";
import type { Cell } from "../writing/spill-table";

const BRANCHES = ["attached", "reversed"] as const;

/** Quantities by the word for `what`: words in the table, and value; η is Hartree's y √((m+1) ue ∕ (2 ν x)). */
const QUANTITIES = {
  "wall shear": ["wall shear f″(0), Hartree's η", (l) => l.wallShear],
  friction: ["wall friction cf·√Rex", (l) => (2 * l.wallShear) / scale(l)],
  defect: ["defect thickness δ*/x·√Rex", (l) => l.defect * scale(l)],
  "momentum loss": ["momentum loss θ/x·√Rex", (l) => l.momentumLoss * scale(l)],
  "energy loss": ["energy loss δ3/x·√Rex", (l) => l.energyLoss * scale(l)],
  "layer height": ["layer height δ/x·√Rex (0.99 ue)", (l) => l.height * scale(l)],
  shape: ["shape factor H", (l) => l.shape],
  "energy shape": ["shape factor H32", (l) => l.energyShape],
  gradient: ["gradient λ = θ² ue′/ν", (l) => l.gradient],
  shear: ["shear S = θ τw/(μ ue)", (l) => l.shear],
  dissipation: ["dissipation D = θ∫(∂u/∂y)²dy/ue²", (l) => l.dissipation],
  beta: ["Hartree's β = 2m/(m+1)", (l) => l.beta],
  "wall value": ["wall value f(0)", (l) => l.wall],
  "wall flow": ["wall flow vw θ/ν", (l) => l.wallFlow],
  "defect in eta": ["defect thickness in Hartree's η", (l) => l.defect],
  "momentum loss in eta": ["momentum loss in Hartree's η", (l) => l.momentumLoss],
} as const satisfies Record<string, readonly [string, (layer: SimilarLayer) => number]>;

type Quantity = keyof typeof QUANTITIES;

/** η of the sheet, y √(ue∕(ν x)), over Hartree's. */
function scale(layer: SimilarLayer): number {
  return Math.sqrt(2 / (layer.m + 1));
}

/**
 * Solves the similar (Falkner–Skan) laminar layer of an edge speed ue ∝ x^m: wall shear, thicknesses and shape factors, also with suction or blowing and with reversed flow.
 * @customfunction SIMILAR_LAYER
 * @requiresParameterAddresses
 * @param {any} m Exponent of the edge speed: 0 flat plate, 1 plane stagnation point, 1/3 round stagnation point (by Mangler's transformation), below 0 decelerating.
 * @param {any} [what] One quantity as a number: wall shear, friction, defect, momentum loss, energy loss, layer height, shape, energy shape, gradient, shear, dissipation, beta, wall value, wall flow, defect in eta, momentum loss in eta; omitted: all of them as a table.
 * @param {any} [branch] attached (default), or reversed: the second layer that a decelerating edge speed allows.
 * @param {any} [wall_velocity] Flow through the wall as (vw/ue)·√(ue x/ν): above 0 blowing, below 0 suction; omitted: a solid wall.
 * @param {CustomFunctions.Invocation} invocation Filled in by the host.
 * @returns {any[][]} A heading row, then quantity and value in a row each; a single value when `what` is given.
 * @family Laminar
 * @unit m 1
 * @unit what word
 * @unit branch word
 * @unit wall_velocity 1
 * @unit result 1
 * @limits m from −0.0904286 (separation) upwards on a solid wall, also far beyond 5; the reversed branch from there to −0.001. Suction lowers and blowing raises the least m; a flat plate is blown off at 0.619. Suction to −20. Outside: #N/A with the limit met.
 * @limits Values good to 1e-9 on a solid wall; f″(0) near separation as √ of the distance to it, as sensitive as the layer itself.
 * @source V. M. Falkner & S. W. Skan, ARC R&M 1314 (1930); D. R. Hartree, Proc. Camb. Phil. Soc. 33 (1937) 223–239; reversed branch K. Stewartson, Proc. Camb. Phil. Soc. 50 (1954) 454–465.
 * @source Flow through the wall: H. W. Emmons & D. C. Leigh, ARC CP 157 (1954).
 * @example =ROUND(WALL.SIMILAR_LAYER(0,"wall shear"),6) → 0.4696
 * @example =ROUND(WALL.SIMILAR_LAYER(1,"shape"),5) → 2.21623
 * @words Falkner Skan Hartree Blasius Hiemenz wedge flow similarity transpiration
 */
export function similarLayer(m: any, what: any, branch: any, wall_velocity: any, invocation: CustomFunctions.Invocation): any[][] {
  const call = openCall("SIMILAR_LAYER", invocation);
  const exponent = readNumber(call, "m", m);
  const wanted = readOptionalChoice(call, "what", what, Object.keys(QUANTITIES) as Quantity[]);
  const made = solveSimilar(exponent, {
    branch: readOptionalChoice(call, "branch", branch, BRANCHES),
    transpiration: readOptionalNumber(call, "wall_velocity", wall_velocity),
  });
  if (!made.ok) throw refusalError(call, made);
  if (wanted !== undefined) return [[QUANTITIES[wanted][1](made.layer)]];
  const rows: Cell[][] = Object.values(QUANTITIES).map(([words, of]) => [words, of(made.layer)]);
  return [["quantity", "value"], ...rows];
}
