import { smoothingSpline, LEAST_POINTS_TO_FIND_NOISE } from "../../numerics/smoothing-spline";
import { edgeCurve } from "../../physics/edge/edge-curve";
import { sentenceOf } from "../errors/sentences";
import { openCall, type Call } from "../reading/call";
import { readColumn } from "../reading/read-column";
import { readNumber } from "../reading/read-value";
import { formatNumber } from "../writing/format-number";

/** Fewer stations leave the curve between them to chance; 15 are the normal coarse column (design.md §5). */
const FEW_STATIONS = 8;
/** A step this many times its neighbour lets a cubic swing; common practice, no source. */
const UNEVEN_STEP = 10;
/** Scatter of the edge speed above this share of its size spoils its gradient; common practice, no source. */
const NOTABLE_SCATTER = 0.002;
/** Reynolds numbers outside this range are rarely meant and usually a slip of units; common practice, no source. */
const USUAL_REYNOLDS = { least: 1e3, most: 1e10 };

type Finding = [check: string, finding: string, advice: string];

/**
 * Checks an edge-speed column before it is marched and spills the findings as text, so that they can be read where a host hides error sentences.
 * @customfunction INPUT_CHECK
 * @requiresParameterAddresses
 * @param {any[][]} x Stations along the wall.
 * @param {any[][]} ue Edge speed at each station.
 * @param {any} nu Kinematic viscosity.
 * @param {CustomFunctions.Invocation} invocation Filled in by the host.
 * @returns {any[][]} A heading row, a verdict row (usable, usable with care, not usable), then check, finding and advice in a row each.
 * @family Sheet
 * @unit x length
 * @unit ue speed
 * @unit nu length²/time
 * @unit result text
 * @limits Finds what can be told from the numbers alone: shape and order of the ranges, signs, spacing, scatter, the curve between stations, the Reynolds number's size.
 * @source Own definition; scatter by generalised cross-validation (Craven & Wahba 1979); the other thresholds are common practice, no source.
 * @example =INDEX(WALL.INPUT_CHECK({0;1;2},{1;0;1},1E-5),2,2) → "not usable"
 * @words validate verify warning audit
 */
export function inputCheck(x: any[][], ue: any[][], nu: any, invocation: CustomFunctions.Invocation): any[][] {
  const call = openCall("INPUT_CHECK", invocation);
  const findings: Finding[] = [];
  const stations = attempt(() => readColumn(call, "x", x, { least: 2, rising: true }), "x", findings);
  const speed = stations && attempt(() => readSpeed(call, ue, stations.length), "ue", findings);
  const viscosity = attempt(() => readNumber(call, "nu", nu, { positive: true }), "nu", findings);
  let usable = findings.length === 0;
  let care = false;
  const warn = (finding: Finding) => {
    findings.push(finding);
    care = true;
  };
  if (stations && speed) {
    findings.push(["stations", `${stations.length} rising, ${formatNumber(stations[0]!)} to ${formatNumber(stations.at(-1)!)}`, ""]);
    findings.push(["edge speed", speed[0] === 0 ? "starts at 0: stagnation start" : "above 0 throughout: leading-edge start unless a start value is given", ""]);
    if (stations.length < FEW_STATIONS) warn(["stations", `only ${stations.length}`, "add stations where ue bends"]);
    checkSteps(stations, warn);
    checkScatter(stations, speed, warn);
    const curve = edgeCurve(stations, speed, { fit: "spline" });
    if (!curve.ok) {
      usable = false;
      findings.push(["edge curve", sentenceOf(call, curve), ""]);
    }
    if (viscosity !== undefined) checkReynolds(stations, speed, viscosity, warn);
  }
  const verdict = !usable ? "not usable" : care ? "usable with care" : "usable";
  return [["check", "finding", "advice"], ["verdict", verdict, ""], ...findings];
}

/** Runs a reader and keeps its sentence as a finding; any other exception is not ours to keep. */
function attempt<T>(read: () => T, check: string, findings: Finding[]): T | undefined {
  try {
    return read();
  } catch (error) {
    if (!(error instanceof Error) || typeof (error as { code?: unknown }).code !== "string") throw error;
    findings.push([check, error.message, "mend this first"]);
    return undefined;
  }
}

/** Edge speeds: the first may be 0 (stagnation point), the others must be above 0. */
function readSpeed(call: Call, ue: unknown, length: number): Float64Array {
  const speed = readColumn(call, "ue", ue, { length, notNegative: true });
  if (speed[0] === 0) {
    const rest = speed.slice();
    rest[0] = 1;
    readColumn(call, "ue", Array.from(rest, (v) => [v]), { positive: true });
    return speed;
  }
  return readColumn(call, "ue", ue, { length, positive: true });
}

function checkSteps(x: Float64Array, warn: (finding: Finding) => void): void {
  for (let i = 2; i < x.length; i++) {
    const ratio = (x[i]! - x[i - 1]!) / (x[i - 1]! - x[i - 2]!);
    if (ratio > UNEVEN_STEP || ratio < 1 / UNEVEN_STEP) {
      const factor = formatNumber(ratio > 1 ? ratio : 1 / ratio);
      warn(["spacing", `neighbouring steps differ ${factor} times at row ${i + 1}`, "add stations, or set edge fit = monotone"]);
      return;
    }
  }
}

function checkScatter(x: Float64Array, ue: Float64Array, warn: (finding: Finding) => void): void {
  if (x.length < LEAST_POINTS_TO_FIND_NOISE) return;
  const smooth = smoothingSpline(x, ue);
  if (!smooth.ok || smooth.origin !== "found") return;
  const share = smooth.noise / largest(ue);
  if (share > NOTABLE_SCATTER) {
    warn(["scatter", `about ${formatNumber(Number((100 * share).toPrecision(2)))} % of the largest ue`, "set edge fit = smooth, or smooth the column first"]);
  }
}

function checkReynolds(x: Float64Array, ue: Float64Array, nu: number, warn: (finding: Finding) => void): void {
  const reynolds = (largest(ue) * (x.at(-1)! - x[0]!)) / nu;
  if (!(reynolds >= USUAL_REYNOLDS.least && reynolds <= USUAL_REYNOLDS.most)) {
    warn(["Reynolds number", `${reynolds.toPrecision(3)} for the whole column`, "check the units of x, ue and nu"]);
  }
}

function largest(values: Float64Array): number {
  return values.reduce((most, value) => Math.max(most, value), 0);
}
