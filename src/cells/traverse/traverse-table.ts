import type { EdgeOrigin } from "../../physics/traverse/find-edge";
import type { NearWallChoice } from "../../physics/traverse/near-wall";
import type { Traverse } from "../../physics/traverse/traverse-integrals";
import { openCall } from "../reading/call";
import { readOptions } from "../reading/read-options";
import { formatNumber } from "../writing/format-number";
import { readTraverse } from "./read-traverse";

/**
 * Reduces a traverse to one table: edge, layer height, thicknesses, mass defect, shape factors, and what the near-wall rule added.
 * @customfunction TRAVERSE_TABLE
 * @requiresParameterAddresses
 * @param {any[][]} y Heights above the wall, rising; a wall point y = 0 with u = 0 may be left out.
 * @param {any[][]} u Speed at each height.
 * @param {any} [nu] Kinematic viscosity, for the law of the wall below the first point; omitted: fitted from the points too.
 * @param {any} [options] Block of label and value, or text: near wall = fitted (default), no-slip or none.
 * @param {any} [edge] Edge speed in one cell, or the inviscid speed at each y as a column; omitted: found from the profile.
 * @param {any[][]} [density] Density at each height; omitted: constant.
 * @param {any} [wall] plane (default), or the radius of a round wall: above 0 flow outside, below 0 flow inside.
 * @param {CustomFunctions.Invocation} invocation Filled in by the host.
 * @returns {any[][]} A heading row, then quantity and value in a row each; blank where the profile does not tell.
 * @family Traverse
 * @unit y length
 * @unit u speed
 * @unit nu length²/time
 * @unit options text
 * @unit edge speed
 * @unit density any
 * @unit wall length
 * @unit result as named in each row
 * @limits Profiles that reach at least 0.95 of the edge speed; a traverse that ends inside the layer gives #N/A.
 * @limits Near-wall rule as in DEFECT_THICKNESS. On Wieghardt's plate (first points at 30 to 60 wall units) the rule supplies 2 to 15 % of δ*; a straight line to the wall would overstate δ* by 0.5 to 10 %.
 * @limits Curve error is the difference between two curves through the same points; it does not contain the scatter of the points.
 * @source Definitions: H. Schlichting & K. Gersten, Boundary-Layer Theory (from memory); law of the wall: D. B. Spalding 1961, κ = 0.41, B = 5.0.
 * @example =INDEX(WALL.TRAVERSE_TABLE({0;0.25;0.5;0.75;1},{0;5;10;15;20},,,20),4,2) → 0.5
 * @words hot-wire pitot reduction summary profile
 */
export function traverseTable(y: any[][], u: any[][], nu: any, options: any, edge: any, density: any[][], wall: any, invocation: CustomFunctions.Invocation): any[][] {
  const call = openCall("TRAVERSE_TABLE", invocation);
  const chosen = readOptions(call, options, ["near wall"]).word("near wall") as NearWallChoice | undefined;
  const t = readTraverse(call, { y, u, edge, density, wall, nu }, chosen);
  return [
    ["quantity", "value"],
    ["edge speed ue", t.edgeSpeed],
    ["layer height δ (0.99 ue)", t.height ?? ""],
    ["defect thickness δ*", t.defect],
    ["momentum loss θ", t.momentumLoss],
    ["energy loss δ3", t.energyLoss],
    ["mass defect m", t.massDefect],
    ["shape factor H", t.shape],
    ["shape factor H32", t.energyShape],
    ["shape factor H1", t.entrainmentShape ?? ""],
    ["points used", t.points],
    ["edge speed from", EDGE_WORDS[t.edgeOrigin]],
    ["near-wall rule", t.nearWall.rule],
    ["share of δ* below the first point", t.share.defect],
    ["share of θ below the first point", t.share.momentumLoss],
    ["share of δ3 below the first point", t.share.energyLoss],
    [`δ* ${withoutWords(t)}`, t.without.defect],
    [`θ ${withoutWords(t)}`, t.without.momentumLoss],
    [`δ3 ${withoutWords(t)}`, t.without.energyLoss],
    ["curve error of δ*, relative", t.curveError.defect],
    ["curve error of θ, relative", t.curveError.momentumLoss],
    ["curve error of δ3, relative", t.curveError.energyLoss],
    ["note", noteOf(t)],
  ];
}

const EDGE_WORDS: Record<EdgeOrigin, string> = {
  given: "given",
  column: "inviscid column, continued to the wall",
  "last point": "the last point",
  "mean of outer points": "mean of the outer points",
};

function withoutWords(t: Traverse): string {
  return t.nearWall.rule === "no-slip" ? "without the part below the first point" : t.nearWall.rule === "fitted" ? "with a straight line to the wall" : "unchanged by a rule";
}

function noteOf(t: Traverse): string {
  const { rule, inner } = t.nearWall;
  if (rule === "fitted" && inner) {
    const per = formatNumber(Number((100 * inner.misfit).toPrecision(2)));
    return `law of the wall fitted to ${inner.points} points: u_τ = ${formatNumber(inner.frictionSpeed)}, ν/u_τ = ${formatNumber(inner.viscousLength)}, misfit ${per} % of ue`;
  }
  if (rule === "measured to the wall") return "the first points lie on one ray from the wall: nothing fitted";
  if (rule === "none") return "nothing below the first point: thicknesses are short of that part";
  return "too few points near the wall, or they do not follow the law of the wall: closed by the no-slip point";
}
