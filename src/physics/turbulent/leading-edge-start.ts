import type { Outcome } from "../../numerics/outcome";
import { refuse } from "../../numerics/outcome";
import type { LayerColumns } from "../layer-columns";
import { giveValue, ROW_STATE } from "../layer-columns";
import { powerLawEnergyShape, type TurbulentBegin } from "./turbulent-run";
import type { TurbulentWall } from "./turbulent-equations";
import { emptyLayer } from "./turbulent-method";
import { emptyTurbulentPlace, turbulentState } from "./turbulent-state";

/** Reθ at which the march takes over: low enough to leave the layer's origin at the edge, high enough for the friction laws to hold. */
const TAKE_OVER_REYNOLDS = 50;
/** Power of Reθ in the friction law of Ludwieg & Tillmann, which carries the layer to there: cf ∝ Reθ^−0.268. */
const FRICTION_POWER = 0.268;

/** A short run in which θ grows from 0 as a power of the distance, before the march takes over. */
interface FirstRun {
  /** Fills the stations that lie inside the run. */
  fill(columns: LayerColumns): void;
}

/**
 * A layer turbulent from a leading edge (or the tip of a cone) at the first station: up to Reθ = 50 it grows by a friction law ∝ Reθ^−0.268
 * at the edge speed there, which puts its origin at the edge: θ ∝ x^0.789.
 */
export function leadingEdgeStart(on: TurbulentWall): Outcome<{ begin: TurbulentBegin; run: FirstRun; startShape: number; startEntrainment: number }> {
  const { x } = on.wall.edge.curve;
  const nose = on.wall.radius !== null && on.wall.radius.value[0] === 0;
  const place = emptyTurbulentPlace(on, 0, 0);
  const theta = (TAKE_OVER_REYNOLDS * place.nu) / place.speed;
  const made = turbulentState(on, nose ? { ...place, radius: 1 } : place, theta);
  if (!made.ok) return made;
  const layer = emptyLayer();
  on.method.layerAt(place, made.state, layer);
  const power = 1 / (1 + FRICTION_POWER);
  // dθ∕dx (+ θ∕x on a cone) = cf∕2 with θ ∝ x^power.
  const run = (theta * (power + (nose ? 1 : 0))) / (layer.friction / 2);
  const takeOver = x[0] + run;
  if (!(takeOver < x[x.length - 1])) return refuse("too short", { argument: "x", values: { value: (place.speed * (x[x.length - 1] - x[0])) / place.nu, least: (place.speed * run) / place.nu } });
  let panel = 0;
  while (x[panel + 1] <= takeOver) panel += 1;
  return {
    ok: true,
    begin: { panel, x: takeOver, state: made.state },
    startShape: made.shape,
    startEntrainment: made.entrainment,
    run: {
      fill(columns) {
        for (let i = 1; i <= panel; i += 1) {
          const share = (x[i] - x[0]) / run;
          const at = theta * Math.pow(share, power);
          const ue = columns.edgeSpeed[i];
          const growth = (power + (nose ? 1 : 0)) / (x[i] - x[0]);
          columns.state[i] = ROW_STATE.turbulent;
          giveValue(columns, "momentumLoss", i, at);
          giveValue(columns, "shape", i, made.shape);
          giveValue(columns, "defect", i, made.shape * at);
          if (on.gas.mach === 0) giveValue(columns, "energyLoss", i, powerLawEnergyShape(made.shape) * at);
          giveValue(columns, "layerHeight", i, (made.shape + layer.entrainShape) * at);
          giveValue(columns, "friction", i, layer.friction * Math.pow(at / theta, -FRICTION_POWER));
          giveValue(columns, "momentumReynolds", i, (ue * at) / place.nu);
          giveValue(columns, "gradient", i, (at * at * on.wall.edge.curve.slope[i]) / place.nu);
          giveValue(columns, "massDefect", i, place.density * ue * made.shape * at);
          giveValue(columns, "blowVelocity", i, place.density * ue * made.shape * at * growth);
          giveValue(columns, "entrainment", i, made.entrainment);
          giveValue(columns, "intermittency", i, 1);
        }
      },
    },
  };
}
