import { checkColumns } from "../../numerics/check-column";
import { gaussLegendre } from "../../numerics/gauss-legendre";
import { monotoneCurve } from "../../numerics/monotone-curve";
import type { Outcome } from "../../numerics/outcome";
import { refuse } from "../../numerics/outcome";
import { panelValue } from "../../numerics/piecewise-cubic";

/** Power of the distance with which the friction of a layer falls behind a leading edge: laminar −1∕2, turbulent near −1∕5. */
const STEEPEST = -0.5;
/** Quadrature of each panel: exact for polynomials of degree 9, and the power of the distance is smooth beyond the first panel. */
const NODES = 5;

export interface FrictionDrag {
  /** ∫ cf (ue∕U)² dx [length]. */
  area: number;
  /** Station to which wall friction is known. */
  to: number;
}

/**
 * Friction force of one side of a wall: ∫ cf (ue∕U)² dx, and along a given direction ∫ cf (ue∕U)² d(along).
 *
 * The integrand is split into a power of the distance from the first station, which carries the leading edge's singularity, and a curve without overshoot.
 *
 * @param x stations [length], n ≥ 2, strictly rising
 * @param cf wall friction 2 τw∕(ρ ue²) at the stations; NaN at the first where it has no finite value there (leading edge, stagnation point), and
 *   NaN at the last ones beyond separation, where friction counts as 0
 * @param ue edge speed [speed], same length
 * @param options.along streamwise coordinate of each station [length]: the component of the force in that direction
 * @param options.breaks stations where the friction jumps (onset): it is carried to there from both sides
 */
export function frictionDrag(x: Float64Array, cf: Float64Array, ue: Float64Array, referenceSpeed: number, options: { along?: Float64Array; breaks?: readonly number[] } = {}): Outcome<{ drag: FrictionDrag }> {
  const bad = checkColumns(x, ue, 2, ["x", "ue"]);
  if (bad) return bad;
  if (cf.length !== x.length) return refuse("lengths differ", { argument: "cf", values: { count: cf.length, expected: x.length } });
  if (!(referenceSpeed > 0)) return refuse("not positive", { argument: "reference_speed", values: { value: referenceSpeed } });
  const first = Number.isNaN(cf[0]) ? 1 : 0;
  let last = x.length - 1;
  while (last >= 0 && Number.isNaN(cf[last])) last -= 1;
  if (last - first < 1) return refuse("too few points", { argument: "cf", values: { count: last - first + 1, least: 2 } });
  for (let i = first; i <= last; i += 1) if (!Number.isFinite(cf[i])) return refuse("gap inside", { argument: "cf", row: i + 1 });

  const share = (i: number): number => cf[i] * (ue[i] / referenceSpeed) ** 2;
  const blank = first === 1;
  const stagnation = ue[0] === 0;
  // From a stagnation point cf ue² grows with the distance; behind a leading edge it falls with a power that two stations tell.
  const power = !blank ? 0 : stagnation ? 1 : leadingPower(share(1), share(2), (x[2] - x[0]) / (x[1] - x[0]));
  const pieces = piecesOf(x, first, last, options.breaks ?? []);
  let area = 0;
  for (const [from, to, begin, end] of pieces) {
    const made = pieceIntegral(x, share, power, from, to, begin, end, options.along);
    if (!made.ok) return made;
    area += made.area;
  }
  if (blank) area += (share(1) * (x[1] - x[0]) * alongRate(x, options.along, 0)) / (1 + power);
  return Number.isFinite(area) ? { ok: true, drag: { area, to: x[last] } } : refuse("not finite", { argument: "cf" });
}

function leadingPower(near: number, far: number, ratio: number): number {
  const power = Math.log(far / near) / Math.log(ratio);
  return Number.isFinite(power) ? Math.min(Math.max(power, STEEPEST), 0) : 0;
}

/** Runs of stations between breaks, and the places to which each is carried. */
function piecesOf(x: Float64Array, first: number, last: number, breaks: readonly number[]): [number, number, number, number][] {
  const inside = [...breaks].filter((b) => b > x[first] && b < x[last]).sort((a, b) => a - b);
  const out: [number, number, number, number][] = [];
  let from = first;
  let begin = x[first];
  for (const at of [...inside, Infinity]) {
    let to = from;
    while (to + 1 <= last && x[to + 1] <= at) to += 1;
    const end = Math.min(at, x[last]);
    if (x[from] <= end) out.push([from, to, begin, end]);
    begin = end;
    from = Math.min(to + 1, last);
    if (at === Infinity) break;
  }
  return out;
}

/** ∫ over one run of stations, carried as it is over the ends. */
function pieceIntegral(
  x: Float64Array,
  share: (i: number) => number,
  power: number,
  from: number,
  to: number,
  begin: number,
  end: number,
  along: Float64Array | undefined,
): Outcome<{ area: number }> {
  const scaled = (i: number): number => share(i) * Math.pow(x[i] - x[0], -power);
  const s0 = x[0];
  const length = (a: number, b: number, rate: number): number => (rate * (Math.pow(b - s0, power + 1) - Math.pow(a - s0, power + 1))) / (power + 1);
  let area = 0;
  if (begin < x[from]) area += scaled(from) * length(begin, x[from], alongRate(x, along, Math.max(from - 1, 0)));
  if (end > x[to]) area += scaled(to) * length(x[to], end, alongRate(x, along, to));
  if (to === from) return { ok: true, area };
  const px = x.subarray(from, to + 1);
  const made = monotoneCurve(px, Float64Array.from(px, (_, i) => scaled(from + i)));
  if (!made.ok) return made;
  const gauss = gaussLegendre(NODES);
  if (!gauss.ok) return gauss;
  for (let i = 0; i + 1 < px.length; i += 1) {
    const h = px[i + 1] - px[i];
    let sum = 0;
    for (let k = 0; k < NODES; k += 1) {
      const t = (1 + gauss.node[k]) / 2;
      sum += (gauss.weight[k] / 2) * panelValue(made.curve, i, t) * Math.pow(px[i] + t * h - s0, power);
    }
    area += sum * h * alongRate(x, along, from + i);
  }
  return { ok: true, area };
}

/** d(along)∕dx of a panel, 1 without a direction. */
function alongRate(x: Float64Array, along: Float64Array | undefined, panel: number): number {
  return along === undefined || panel + 1 >= x.length ? 1 : (along[panel + 1] - along[panel]) / (x[panel + 1] - x[panel]);
}
