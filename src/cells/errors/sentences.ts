import type { Reason, Refusal } from "../../numerics/outcome";
import type { Call } from "../reading/call";
import { placeOf } from "../reading/call";
import { formatNumber } from "../writing/format-number";
import { cellError, type ErrorCode } from "./cell-error";

interface Sentence {
  code: ErrorCode;
  /** What the function needs, after "NAME needs". */
  need: (argument: string, v: Values) => string;
  /** What was found instead, after the place; "" where the place says it all. */
  found: (v: Values) => string;
}

type Values = (name: string) => string;

/** The one table of sentences: a refusal's code → what a user reads. */
const SENTENCES: Record<Reason, Sentence> = {
  "too few points": {
    code: "#VALUE!",
    need: (a, v) => `at least ${v("least")} numbers in ${a}`,
    found: (v) => `${v("count")} given`,
  },
  "lengths differ": {
    code: "#VALUE!",
    need: (a, v) => `${a} of ${v("expected")} rows, as long as the first column`,
    found: (v) => `${v("count")} given`,
  },
  "not rising": { code: "#VALUE!", need: (a) => `rising ${a}`, found: (v) => `has ${v("value")} after ${v("before")}` },
  "not finite": { code: "#VALUE!", need: (a) => `finite numbers in ${a}`, found: () => "is too large or not a number" },
  "not positive": { code: "#VALUE!", need: (a) => `${a} above 0`, found: (v) => `has ${v("value")}` },
  negative: { code: "#VALUE!", need: (a) => `${a} of 0 or more`, found: (v) => `has ${v("value")}` },
  "outside range": {
    code: "#VALUE!",
    need: (a, v) => {
      const [least, most] = [v("least"), v("most")];
      return least === "-Infinity" ? `${a} of at most ${most}` : most === "Infinity" ? `${a} of at least ${least}` : `${a} between ${least} and ${most}`;
    },
    found: (v) => `has ${v("value")}`,
  },
  "outside column": {
    code: "#N/A",
    need: (a, v) => `${a} inside the column, ${v("least")} to ${v("most")}`,
    found: (v) => `asks for ${v("value")}, and nothing is extrapolated`,
  },
  "curve not positive": {
    code: "#VALUE!",
    need: () => "an edge speed that stays above 0 between its stations",
    found: () => "starts a step where the fitted curve dips to 0 or below; add a station there or set edge fit = monotone",
  },
  "stagnation not rising": {
    code: "#VALUE!",
    need: () => "an edge speed that rises linearly from a start at 0",
    found: () => "starts at 0 with a gradient that is not positive; begin at a station where the speed is above 0 and give start momentum loss",
  },
  "start fixed": {
    code: "#VALUE!",
    need: () => "no start momentum loss where the layer's start is fixed",
    found: () => "has edge speed or radius 0, which fixes it; leave the option out",
  },
  "no edge found": {
    code: "#N/A",
    need: () => "a traverse that reaches the layer's edge",
    found: () => "the speed still rises at the last point; give the edge speed",
  },
  "edge below profile": {
    code: "#VALUE!",
    need: (a) => `${a} not far below the profile's own speeds`,
    found: (v) => `has ${v("value")} where the profile reaches ${v("speed")}`,
  },
  "ends inside layer": {
    code: "#N/A",
    need: () => "a traverse that reaches the layer's edge",
    found: (v) => `ends at ${v("reached")} of the edge speed`,
  },
  "slips at wall": { code: "#VALUE!", need: () => "no speed at the wall, y = 0", found: (v) => `has ${v("value")}` },
  "outside axis": {
    code: "#VALUE!",
    need: (a) => `${a} as a radius, above 0 for flow outside a round body, below 0 (and larger than the traverse) inside a round duct`,
    found: (v) => `it has ${v("value")} with a traverse ${v("height")} high`,
  },
  "repeats a point": { code: "#VALUE!", need: () => "wall points that differ from their neighbours", found: () => "repeats the point before" },
  "contour crosses": {
    code: "#VALUE!",
    need: () => "points in order along a contour that does not cross itself",
    found: (v) => `begins a segment that crosses the one from row ${v("other")}`,
  },
  "no stagnation point": {
    code: "#VALUE!",
    need: () => "taps on both sides of a stagnation point, an inner maximum of cp",
    found: (v) => `has the highest cp, ${v("value")}, with no lower one on both sides`,
  },
  "sides alike": { code: "#VALUE!", need: () => "an upper and a lower side", found: () => "both lie at the same mean height" },
  "profile undetermined": { code: "#N/A", need: () => "a profile that fixes the answer", found: () => "this one does not" },
  "fit undetermined": { code: "#N/A", need: () => "points that determine the fit", found: () => "these do not" },
  "noise undetermined": {
    code: "#N/A",
    need: () => "a column from which the noise can be told",
    found: () => "cross-validation finds no minimum; give the noise as a number",
  },
  "start shape alone": {
    code: "#VALUE!",
    need: () => "a start momentum loss beside the start shape",
    found: () => "none is given",
  },
  "no similar layer": {
    code: "#N/A",
    need: (a, v) => `${a} of at least ${v("least")}, below which no similar layer exists`,
    found: (v) => `has ${v("value")}`,
  },
  "no reversed layer": {
    code: "#N/A",
    need: (a, v) => `${a} between ${v("least")} and ${v("most")} for the reversed branch`,
    found: (v) => `has ${v("value")}`,
  },
  "layer lifts off": {
    code: "#N/A",
    need: (a) => `${a} that leaves the layer on the wall`,
    found: () => "blows strongly enough to lift it off",
  },
  "reference speed missing": { code: "#VALUE!", need: () => "a reference speed beside the reference Mach number", found: () => "none is given" },
  "beyond vacuum": { code: "#VALUE!", need: () => "edge speeds that the reference stream can reach", found: (v) => `has ${v("value")}, beyond its expansion into vacuum` },
  "turbulent from stagnation": {
    code: "#VALUE!",
    need: () => "a turbulent layer that begins where the edge speed is above 0",
    found: () => "has 0 (stagnation point, where a layer is laminar); use LAYER_MARCH, or begin at a later station with start values",
  },
  "start given twice": { code: "#VALUE!", need: () => "one start value", found: () => "both start momentum loss and start Re theta are given" },
  "too short": {
    code: "#N/A",
    need: (_a, v) => `a wall long enough for a turbulent layer, Re x of ${v("least")}`,
    found: (v) => `it ends at Re x of ${v("value")}`,
  },
  "gap inside": { code: "#VALUE!", need: (a) => `${a} without gaps between its first and last numbers`, found: () => "is empty" },
  "pressure missing": { code: "#VALUE!", need: () => "the static pressure coefficient at the rake beside total pressures", found: () => "none is given" },
  "ends inside wake": {
    code: "#N/A",
    need: (_a, v) => `a rake that reaches the undisturbed stream on both sides (total-pressure coefficient 1 within ${v("tolerance")})`,
    found: (v) => `has ${v("value")}`,
  },
  "pressure never rises": { code: "#N/A", need: () => "a pressure that rises somewhere behind its lowest value", found: () => "it falls to the end, so nothing separates" },
  "onset outside": {
    code: "#VALUE!",
    need: (_a, v) => `an onset station inside the column, ${v("least")} to ${v("most")}`,
    found: (v) => `has ${v("value")}; write "from start" for a layer turbulent throughout`,
  },
  "onset too early": {
    code: "#N/A",
    need: (_a, v) => `an onset where Re θ is at least ${v("least")}`,
    found: (v) => `finds ${v("value")} there, too little for a turbulent layer`,
  },
  "no convergence": {
    code: "#N/A",
    need: () => "an iteration that settles",
    found: (v) => `it stopped after ${v("count")} steps`,
  },
};

/** The sentence for a refusal, in the form `NAME needs …; row 7 (A11) has …`. */
export function sentenceOf(call: Call, refusal: Refusal): string {
  const v: Values = (name) => {
    const value = refusal.values?.[name];
    return value === undefined ? "another value" : formatNumber(value);
  };
  const sentence = SENTENCES[refusal.reason];
  const place = placeOf(call, refusal);
  const words = sentence.found(v);
  const found = place === "" ? words.replace(/^(?=(?:has|ends|asks|repeats|blows) )/, "it ") : `${place} ${words}`.trim();
  return `${call.name} needs ${sentence.need(refusal.argument ?? "its input", v)}; ${found}`;
}

/** The error to throw for a refusal. */
export function refusalError(call: Call, refusal: Refusal): Error {
  return cellError(SENTENCES[refusal.reason].code, sentenceOf(call, refusal));
}
