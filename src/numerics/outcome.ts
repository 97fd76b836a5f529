/**
 * Why a calculation gives no result. The words a user reads are made from these codes in one place,
 * `src/cells/errors/sentences.ts`; a new code is added here first and the compiler then asks for its sentence.
 */
export type Reason =
  | "too few points"
  | "lengths differ"
  | "not rising"
  | "not finite"
  | "not positive"
  | "negative"
  | "outside range"
  | "outside column"
  | "curve not positive"
  | "stagnation not rising"
  | "start fixed"
  | "no edge found"
  | "edge below profile"
  | "ends inside layer"
  | "slips at wall"
  | "outside axis"
  | "repeats a point"
  | "contour crosses"
  | "no stagnation point"
  | "sides alike"
  | "profile undetermined"
  | "fit undetermined"
  | "noise undetermined"
  | "start shape alone"
  | "no similar layer"
  | "no reversed layer"
  | "layer lifts off"
  | "reference speed missing"
  | "beyond vacuum"
  | "turbulent from stagnation"
  | "start given twice"
  | "too short"
  | "onset outside"
  | "gap inside"
  | "pressure missing"
  | "ends inside wake"
  | "pressure never rises"
  | "onset too early"
  | "no convergence";

/** A refusal: what is wrong and where. */
export interface Refusal {
  ok: false;
  reason: Reason;
  /** Which argument is concerned, by the name the caller knows (`x`, `ue`, …). */
  argument?: string;
  /** Row counted from 1 at the first entry of that argument. */
  row?: number;
  /** Station or height where it happens. */
  at?: number;
  /** Numbers the sentence may name, such as the offending value or the limit. */
  values?: Readonly<Record<string, number>>;
}

/** Either the named results or a refusal; never a NaN in disguise. */
export type Outcome<T extends object> = ({ ok: true } & T) | Refusal;

/** Shorthand for a refusal. */
export function refuse(reason: Reason, place: Omit<Refusal, "ok" | "reason"> = {}): Refusal {
  return { ok: false, reason, ...place };
}
