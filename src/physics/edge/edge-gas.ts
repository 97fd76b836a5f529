import type { Outcome } from "../../numerics/outcome";
import { refuse } from "../../numerics/outcome";
import { GAMMA_OF_AIR, MOST_MACH } from "./edge-speed";

/** The stream that carries the edge: with Mach number 0 density and viscosity are the same everywhere. */
export interface EdgeGas {
  mach: number;
  /** Speed at which the Mach number holds [speed]; any number where mach is 0. */
  speed: number;
  gamma: number;
}

/** The edge's gas at one place. */
export interface GasPlace {
  machSquare: number;
  /** ρe∕ρ∞. */
  density: number;
  /** νe∕ν∞. */
  viscosity: number;
}

export const CONSTANT_DENSITY: EdgeGas = { mach: 0, speed: 1, gamma: GAMMA_OF_AIR };

/** Exponent of μ ∝ T^0.76 for air from 200 to 500 K, 2 % (common engineering fit, from memory: White, Viscous Fluid Flow, table 1-2, gives 0.666 to 0.76). */
const VISCOSITY_POWER = 0.76;

/**
 * Reads the reference stream: Mach number and the speed at which it holds.
 *
 * @param mach reference Mach number ≥ 0; 0 is constant density
 * @param speed reference speed [speed], > 0; needed where mach is above 0
 */
export function edgeGas(mach: number, speed: number | undefined, gamma = GAMMA_OF_AIR): Outcome<{ gas: EdgeGas }> {
  if (!(mach >= 0)) return refuse("negative", { argument: "reference Mach", values: { value: mach } });
  if (mach > MOST_MACH) return refuse("outside range", { argument: "reference Mach", values: { value: mach, least: 0, most: MOST_MACH } });
  if (!(gamma > 1)) return refuse("outside range", { argument: "gamma", values: { value: gamma, least: 1, most: Infinity } });
  if (mach === 0) return { ok: true, gas: CONSTANT_DENSITY };
  if (speed === undefined || !(speed > 0)) return refuse("reference speed missing", { argument: "reference speed" });
  return { ok: true, gas: { mach, speed, gamma } };
}

/**
 * Mach number, density and viscosity where the edge speed is `ue`: isentropic (NACA Report 1135), viscosity by a power of the temperature.
 * False beyond the speed of expansion into vacuum.
 */
export function gasPlace(gas: EdgeGas, ue: number, out: GasPlace): boolean {
  if (gas.mach === 0) {
    out.machSquare = 0;
    out.density = 1;
    out.viscosity = 1;
    return true;
  }
  const ratio = ue / gas.speed;
  const m2 = gas.mach * gas.mach;
  const temperature = 1 + ((gas.gamma - 1) / 2) * m2 * (1 - ratio * ratio);
  if (!(temperature > 0)) return false;
  out.machSquare = (m2 * ratio * ratio) / temperature;
  out.density = Math.pow(temperature, 1 / (gas.gamma - 1));
  out.viscosity = Math.pow(temperature, VISCOSITY_POWER) / out.density;
  return true;
}

/** The first station whose edge speed the stream cannot reach, counted from 1; 0 where there is none. */
export function firstBeyondVacuum(gas: EdgeGas, ue: Float64Array): number {
  const place: GasPlace = { machSquare: 0, density: 1, viscosity: 1 };
  return ue.findIndex((v) => !gasPlace(gas, v, place)) + 1;
}
