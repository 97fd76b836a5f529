/** Complex numbers as Excel writes them in text (`3+4i`, `-j`), and functions of them. */
import type { EngineArgument, EngineLibrary } from "../types";
import { addMissing, numberOf, rowFirst } from "./define";
import { fail } from "./elementary";
import { excelNumberText } from "./number-text";
import { textOf } from "./text-and-kind";

interface Complex {
  re: number;
  im: number;
  unit?: "i" | "j";
}

const NUMBER = "(?:[0-9]+\\.?[0-9]*|\\.[0-9]+)(?:E[+-]?[0-9]+)?";
const WRITTEN = new RegExp(`^(?:([+-]?${NUMBER})(?![0-9.ij]))?(?:([+-]?(?:${NUMBER})?)([ij]))?$`, "i");

export function installComplex(library: EngineLibrary): void {
  const one = (name: string, description: string, f: (z: Complex) => Complex | number) => addMissing(library, name, description, ["number (any)"], (z) => shown(f(read(z)), read(z).unit));
  const pooled = (name: string, description: string, f: (a: Complex, b: Complex) => Complex) =>
    addMissing(library, name, description, ["number (any, range, repeating)"], (...args) => {
      const all = args.flatMap((arg) => (Array.isArray(arg) ? rowFirst(arg).filter((v) => v.value !== null) : [arg])).map(read);
      return shown(all.reduce(f), oneUnit(all));
    });
  const two = (name: string, description: string, f: (a: Complex, b: Complex) => Complex) =>
    addMissing(library, name, description, ["number1 (any)", "number2 (any)"], (a, b) => shown(f(read(a), read(b)), oneUnit([read(a), read(b)])));

  addMissing(library, "COMPLEX", "A complex number from its parts.", ["real (number)", "imaginary (number)", "unit (string, optional)"], (re, im, unit) => {
    const mark = unit === undefined ? "i" : textOf(unit);
    return mark === "i" || mark === "j" ? shown({ re: numberOf(re), im: numberOf(im) }, mark) : fail("COMPLEX needs the unit i or j.", "#VALUE!");
  });
  one("IMREAL", "Real part.", (z) => z.re);
  one("IMAGINARY", "Imaginary part.", (z) => z.im);
  one("IMABS", "Absolute value.", (z) => Math.hypot(z.re, z.im));
  one("IMARGUMENT", "Angle in radians.", (z) => (z.re === 0 && z.im === 0 ? fail("Zero has no angle.", "#DIV/0!") : Math.atan2(z.im, z.re)));
  one("IMCONJUGATE", "Complex conjugate.", (z) => ({ re: z.re, im: -z.im }));
  one("IMEXP", "Exponential.", (z) => polar(Math.exp(z.re), z.im));
  one("IMLN", "Natural logarithm.", log);
  one("IMLOG10", "Logarithm to the base 10.", (z) => times(log(z), { re: Math.LOG10E, im: 0 }));
  one("IMSQRT", "Square root.", (z) => polar(Math.sqrt(Math.hypot(z.re, z.im)), Math.atan2(z.im, z.re) / 2));
  one("IMSIN", "Sine.", (z) => ({ re: Math.sin(z.re) * Math.cosh(z.im), im: Math.cos(z.re) * Math.sinh(z.im) }));
  one("IMCOS", "Cosine.", (z) => ({ re: Math.cos(z.re) * Math.cosh(z.im), im: -Math.sin(z.re) * Math.sinh(z.im) }));
  one("IMSINH", "Hyperbolic sine.", (z) => ({ re: Math.sinh(z.re) * Math.cos(z.im), im: Math.cosh(z.re) * Math.sin(z.im) }));
  one("IMCOSH", "Hyperbolic cosine.", (z) => ({ re: Math.cosh(z.re) * Math.cos(z.im), im: Math.sinh(z.re) * Math.sin(z.im) }));
  pooled("IMSUM", "Sum.", (a, b) => ({ re: a.re + b.re, im: a.im + b.im }));
  pooled("IMPRODUCT", "Product.", times);
  two("IMSUB", "Difference.", (a, b) => ({ re: a.re - b.re, im: a.im - b.im }));
  two("IMDIV", "Quotient.", (a, b) => {
    const square = b.re * b.re + b.im * b.im;
    return square === 0 ? fail("IMDIV divides by zero.") : { re: (a.re * b.re + a.im * b.im) / square, im: (a.im * b.re - a.re * b.im) / square };
  });
  addMissing(library, "IMPOWER", "Power.", ["number (any)", "power (number)"], (z, power) => {
    const [base, n] = [read(z), numberOf(power)];
    if (base.re === 0 && base.im === 0) return n > 0 ? "0" : fail("Zero to this power has no value.");
    return shown(polar(Math.hypot(base.re, base.im) ** n, n * Math.atan2(base.im, base.re)), base.unit);
  });
}

function read(argument: EngineArgument): Complex {
  const value = Array.isArray(argument) ? argument[0]?.[0]?.value : argument?.value;
  if (typeof value === "boolean") fail("A complex number is needed, not a truth value.", "#VALUE!");
  if (typeof value !== "string") return { re: numberOf(argument), im: 0 };
  const text = textOf(argument);
  const match = text === "" ? null : WRITTEN.exec(text);
  if (!match) return fail(`A complex number is needed, not "${text}".`);
  const [, re, im, unit] = match;
  if (unit !== undefined && re !== undefined && im !== undefined && !/^[+-]/.test(im)) fail(`A complex number is needed, not "${text}".`);
  return { re: Number(re ?? 0), im: unit === undefined ? 0 : im === "" || im === "+" ? 1 : im === "-" ? -1 : Number(im), ...(unit === "i" || unit === "j" ? { unit } : {}) };
}

function oneUnit(all: readonly Complex[]): "i" | "j" | undefined {
  const units = new Set(all.flatMap((z) => (z.unit === undefined ? [] : [z.unit])));
  return units.size > 1 ? fail("The complex numbers use both i and j.", "#VALUE!") : [...units][0];
}

/** Fifteen digits, as Excel writes them. */
function shown(z: Complex | number, unit: "i" | "j" = "i"): number | string {
  if (typeof z === "number") return z;
  if (!Number.isFinite(z.re) || !Number.isFinite(z.im)) fail("The complex number is too large.");
  const [re, im] = [excelNumberText(z.re), excelNumberText(Math.abs(z.im))];
  if (im === "0") return re;
  const size = im === "1" ? "" : im;
  return `${re === "0" ? "" : re}${z.im < 0 ? "-" : re === "0" ? "" : "+"}${size}${unit}`;
}

function times(a: Complex, b: Complex): Complex {
  return { re: a.re * b.re - a.im * b.im, im: a.re * b.im + a.im * b.re };
}

function polar(size: number, angle: number): Complex {
  return { re: size * Math.cos(angle), im: size * Math.sin(angle) };
}

function log(z: Complex): Complex {
  const size = Math.hypot(z.re, z.im);
  return size === 0 ? fail("Zero has no logarithm.") : { re: Math.log(size), im: Math.atan2(z.im, z.re) };
}
