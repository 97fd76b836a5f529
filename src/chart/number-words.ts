/** Digits a reading shows: more than any method here is good for, fewer than the eye gets lost in. */
const SIGNIFICANT = 4;
/** Within these a plain number reads better than a power of ten. */
const LEAST_PLAIN = 1e-5;
const GREATEST_PLAIN = 1e7;
/** Decimals after which the marks of an axis are powers of ten. */
const MOST_DECIMALS = 6;
/** From here on digits are grouped in threes. */
const GROUPED_FROM = 10000;

/** Narrow space that does not break. */
const GROUP = "\u202f";
const SUPERSCRIPTS = "⁰¹²³⁴⁵⁶⁷⁸⁹";

/** A finite number to four digits: `0.0003123`, `−12.5`, `1 250 000`, `3.1×10⁻⁶`; no zeros at the end. */
export function numberWords(value: number): string {
  const size = Math.abs(value);
  if (size === 0) return "0";
  const rounded = Number(value.toPrecision(SIGNIFICANT));
  if (size < LEAST_PLAIN || size >= GREATEST_PLAIN) return powerWords(rounded);
  return plain(rounded);
}

/** The marks of one axis, all in one form: `0, 0.0001, 0.0002` or `0, 2×10⁻⁷, 4×10⁻⁷`. `step` is the distance of linear marks. */
export function tickWords(values: readonly number[], step: number): string[] {
  const decimals = decimalsOf(step);
  const greatest = Math.max(0, ...values.map(Math.abs));
  if (decimals > MOST_DECIMALS || greatest >= GREATEST_PLAIN) return values.map((v) => powerWords(Number(v.toPrecision(12))));
  return values.map((v) => (v === 0 ? "0" : grouped(v.toFixed(decimals))));
}

/** The marks of a log axis: each a plain number while it reads well, `10⁷` and the like beyond. */
export function logTickWords(values: readonly number[]): string[] {
  return values.map((v) => (v < LEAST_PLAIN || v >= GREATEST_PLAIN ? powerWords(v) : plain(v)));
}

function plain(value: number): string {
  // toFixed never falls into exponents below 1e21; 12 decimals hold every number from 1e-5 on with its digits.
  return grouped(value.toFixed(12).replace(/\.?0+$/, ""));
}

/** `3.1×10⁻⁶`, and `10⁻⁶` alone for 1×10⁻⁶. */
function powerWords(value: number): string {
  if (value === 0) return "0";
  const [digits, exponent] = value.toExponential().split("e") as [string, string];
  if (exponent === "+0") return grouped(digits);
  const power = "10" + [...String(Number(exponent))].map((c) => (c === "-" ? "⁻" : SUPERSCRIPTS[Number(c)]!)).join("");
  if (digits === "1") return power;
  return digits === "-1" ? "−" + power : `${digits.replace("-", "−")}×${power}`;
}

/** Decimals that show a step of 1, 2, 2.5 or 5 times a power of ten exactly. */
function decimalsOf(step: number): number {
  if (!(step > 0)) return 0;
  for (let d = 0; d <= MOST_DECIMALS; d++) if (Math.abs(step * 10 ** d - Math.round(step * 10 ** d)) < 1e-6 * step * 10 ** d) return d;
  return MOST_DECIMALS + 1;
}

/** Minus sign, and digits in threes from 10 000 on. */
function grouped(text: string): string {
  const sign = text.startsWith("-") && Number(text) !== 0 ? "−" : "";
  const [whole, fraction] = text.replace("-", "").split(".") as [string, string?];
  const parts = Number(whole) >= GROUPED_FROM ? whole.replace(/\B(?=(\d{3})+$)/g, GROUP) : whole;
  return sign + parts + (fraction === undefined ? "" : "." + fraction);
}
