/**
 * CONVERT with the exact definitions of the units; the engine (19.3.7) rounds them to six digits (1 lbf as 4.44822 N).
 * Factors: B. N. Taylor & A. Thompson, NIST SP 811 (2008), Appendix B and the definitions of the SI (2019), from memory.
 */
import type { EngineLibrary } from "../types";
import { define, numberOf } from "./define";
import { fail } from "./elementary";
import { textOf } from "./text-and-kind";

const INCH = 0.0254;
const FOOT = 0.3048;
const YARD = 0.9144;
const MILE = 1609.344;
const SEA_MILE = 1852;
const LIGHT_YEAR = 9.4607304725808e15;
const PARSEC = (149_597_870_700 * 648_000) / Math.PI;
const PICA_POINT = INCH / 72;
const POUND = 0.45359237;
const GRAVITY = 9.80665;
const POUND_FORCE = POUND * GRAVITY;
const GALLON = 231 * INCH ** 3;
const UK_GALLON = 4.54609e-3;
const HORSEPOWER = 550 * FOOT * POUND_FORCE;
const DAY = 86_400;

interface Unit {
  kind: string;
  factor: number;
  /** Power to which a metric prefix is raised; 0 where none is taken. */
  prefix: number;
}

/** `name name: factor`, by kind; a name ending in * takes metric prefixes. */
const KINDS: Record<string, Record<string, number>> = {
  mass: { "g*": 1e-3, sg: (POUND * GRAVITY) / FOOT, lbm: POUND, "u*": 1.6605390666e-27, ozm: POUND / 16, grain: POUND / 7000, "cwt shweight": 100 * POUND, "lcwt uk_cwt hweight": 112 * POUND, stone: 14 * POUND, ton: 2000 * POUND, "uk_ton LTON brton": 2240 * POUND },
  length: { "m*": 1, mi: MILE, Nmi: SEA_MILE, in: INCH, ft: FOOT, yd: YARD, "ang*": 1e-10, ell: 45 * INCH, "ly*": LIGHT_YEAR, "parsec* pc*": PARSEC, "Picapt Pica": PICA_POINT, pica: INCH / 6, survey_mi: (5280 * 1200) / 3937 },
  time: { yr: 365.25 * DAY, "day d": DAY, hr: 3600, "mn min": 60, "sec* s*": 1 },
  pressure: { "Pa* p*": 1, "atm* at*": 101_325, "mmHg*": 133.322387415, psi: POUND_FORCE / INCH ** 2, Torr: 101_325 / 760 },
  force: { "N*": 1, "dyn* dy*": 1e-5, lbf: POUND_FORCE, "pond*": GRAVITY / 1000 },
  energy: { "J*": 1, "e*": 1e-7, "c*": 4.184, "cal*": 4.1868, "eV* ev*": 1.602176634e-19, "HPh hh": HORSEPOWER * 3600, "Wh* wh*": 3600, flb: FOOT * POUND_FORCE, "BTU btu": 1055.05585262 },
  power: { "HP h": HORSEPOWER, PS: 75 * GRAVITY, "W* w*": 1 },
  magnetism: { "T*": 1, "ga*": 1e-4 },
  volume: {
    tsp: GALLON / 768, tspm: 5e-6, tbs: GALLON / 256, oz: GALLON / 128, cup: GALLON / 16, "pt us_pt": GALLON / 8, uk_pt: UK_GALLON / 8, qt: GALLON / 4, uk_qt: UK_GALLON / 4, gal: GALLON, uk_gal: UK_GALLON, "l* L* lt*": 1e-3,
    barrel: 42 * GALLON, bushel: 2150.42 * INCH ** 3, "ft3 ft^3": FOOT ** 3, "in3 in^3": INCH ** 3, "m3* m^3*": 1, "mi3 mi^3": MILE ** 3, "yd3 yd^3": YARD ** 3, "Nmi3 Nmi^3": SEA_MILE ** 3, "GRT regton": 100 * FOOT ** 3, MTON: 40 * FOOT ** 3,
  },
  area: { uk_acre: 4840 * YARD ** 2, us_acre: 43_560 * (1200 / 3937) ** 2, "ar*": 100, "ft2 ft^2": FOOT ** 2, ha: 1e4, "in2 in^2": INCH ** 2, "m2* m^2*": 1, Morgen: 2500, "mi2 mi^2": MILE ** 2, "Nmi2 Nmi^2": SEA_MILE ** 2, "yd2 yd^2": YARD ** 2 },
  information: { "bit*": 1, "byte*": 8 },
  speed: { admkn: (6080 * FOOT) / 3600, kn: SEA_MILE / 3600, "m/h* m/hr*": 1 / 3600, "m/s* m/sec*": 1, mph: MILE / 3600 },
};
/** Temperature: kelvins a degree, and kelvins at zero. */
const TEMPERATURES: Record<string, [number, number]> = { C: [1, 273.15], cel: [1, 273.15], K: [1, 0], kel: [1, 0], F: [5 / 9, 273.15 - 160 / 9], fah: [5 / 9, 273.15 - 160 / 9], Rank: [5 / 9, 0], Reau: [1.25, 273.15] };
const PREFIXES: Record<string, number> = { Y: 24, Z: 21, E: 18, P: 15, T: 12, G: 9, M: 6, k: 3, h: 2, da: 1, e: 1, d: -1, c: -2, m: -3, u: -6, n: -9, p: -12, f: -15, a: -18, z: -21, y: -24 };
const BINARY: Record<string, number> = { Ki: 10, Mi: 20, Gi: 30, Ti: 40, Pi: 50, Ei: 60 };

const UNITS = new Map<string, Unit>();
for (const [kind, units] of Object.entries(KINDS)) {
  for (const [names, factor] of Object.entries(units)) {
    for (const name of names.split(" ")) UNITS.set(name.replace("*", ""), { kind, factor, prefix: name.endsWith("*") ? Number(/\d/.exec(name)?.[0] ?? 1) : 0 });
  }
}

export function installConvert(library: EngineLibrary): void {
  define(library, "CONVERT", "A number in another unit.", ["number (number)", "from_unit (string)", "to_unit (string)"], (number, from, to) => convert(numberOf(number), textOf(from), textOf(to)));
}

function convert(x: number, from: string, to: string): number {
  const [warm, other] = [TEMPERATURES[from], TEMPERATURES[to]];
  if (warm && other) return from === to ? x : Number(((x * warm[0] + warm[1] - other[1]) / other[0]).toPrecision(15));
  const [a, b] = [unit(from), unit(to)];
  if (a.kind !== b.kind) fail(`"${from}" is a unit of ${a.kind}, "${to}" one of ${b.kind}.`, "#N/A");
  return from === to ? x : (x * a.factor) / b.factor;
}

function unit(name: string): Unit {
  const known = UNITS.get(name);
  if (known) return known;
  for (const length of [1, 2]) {
    const base = UNITS.get(name.slice(length));
    const prefix = name.slice(0, length);
    if (base?.kind === "information" && Object.hasOwn(BINARY, prefix)) return { ...base, factor: base.factor * 2 ** BINARY[prefix]! };
    if (base && base.prefix > 0 && Object.hasOwn(PREFIXES, prefix)) return { ...base, factor: base.factor * Number(`1e${PREFIXES[prefix]! * base.prefix}`) };
  }
  return Object.hasOwn(TEMPERATURES, name) ? { kind: "temperature", factor: 1, prefix: 0 } : fail(`CONVERT does not know the unit "${name}".`, "#N/A");
}
