import { laminarSolution } from "./laminar-solution";
import { marchOf, separationOf } from "./march-of";
import { energyOf, fieldOf, REFERENCE_FLOWS, separationStation, wallOf } from "./wall-of";

/** How far one laminar method is from one full solution: relative errors, cf and H up to a share of the way to separation. */
export interface MethodError {
  flow: string;
  method: "Thwaites" | "energy" | "field";
  /** Largest relative errors up to half the way, and up to nine tenths. */
  half: { momentumLoss: number; defect: number; shape: number; friction: number };
  most: { momentumLoss: number; defect: number; shape: number; friction: number };
  separation: number;
}

const COLUMNS = { momentumLoss: "theta", defect: "dstar", shape: "H", friction: "cf" } as const;

/** Every laminar method on every reference flow (test/references/laminar_*.csv), the edge speed given at the files' stations. */
export function methodErrors(): MethodError[] {
  return Object.entries(REFERENCE_FLOWS).flatMap(([flow, ue]) => {
    const full = laminarSolution(flow);
    const stations = full.column("x");
    const x = Float64Array.of(0, ...stations, 1.02 * full.separation, 1.05 * full.separation);
    const speeds = x.map(ue);
    const wall = wallOf(x, speeds);
    const thwaites = marchOf(x, speeds);
    const [energy, field] = [energyOf(wall), fieldOf(wall)];
    const rows = [
      { method: "Thwaites", march: thwaites, station: separationOf(thwaites).x },
      { method: "energy", march: energy, station: separationStation(energy) },
      { method: "field", march: field, station: separationStation(field) },
    ] as const;
    return rows.map(({ method, march, station }) => {
      const upTo = (share: number): MethodError["half"] => {
        const worst = (key: keyof typeof COLUMNS): number =>
          full.column(COLUMNS[key]).reduce((most, v, i) => (stations[i] <= share * full.separation && Math.abs(march[key][i + 1] / v - 1) > Math.abs(most) ? march[key][i + 1] / v - 1 : most), 0);
        return { momentumLoss: worst("momentumLoss"), defect: worst("defect"), shape: worst("shape"), friction: worst("friction") };
      };
      return { flow, method, half: upTo(0.5), most: upTo(0.9), separation: station / full.separation - 1 };
    });
  });
}
