import { incipientSimilar, similarBranch } from "../../../src/physics/laminar/similar-branch";
import { solveSimilarNodes } from "../../../src/physics/laminar/similar-equations";
import type { SimilarNodes } from "../../../src/physics/laminar/similar-equations";
import type { SimilarLayer } from "../../../src/physics/laminar/similar-layer";
import { similarQuantities } from "../../../src/physics/laminar/similar-layer";

/** A family of similar layers of one wall value f(0), from strong acceleration to the verge of separation and on into reversed flow. */
export interface ClosureFamily {
  wall: number;
  verge: SimilarLayer;
  /** Each with its distance from the verge in the energy shape: w = ±√(H32 − H32 of the verge), below 0 reversed. */
  layers: { w: number; layer: SimilarLayer }[];
}

/** β of the most accelerated layer, and how far into reversed flow, as a share of the verge's defect thickness. */
const MOST_BETA = 20;
const REVERSED = 0.55;

/** The family of a wall value, in `count` steps of √defect thickness; layers near the verge are close together in w. */
export function closureFamily(wall: number, count: number): ClosureFamily | null {
  const verge = incipientSimilar(wall);
  if (!verge.ok) return null;
  const last = similarQuantities(0, wall, verge.nodes);
  const layers: ClosureFamily["layers"] = [];
  const add = (nodes: SimilarNodes, sign: number): void => {
    const layer = similarQuantities(0, wall, nodes);
    layers.push({ w: sign * Math.sqrt(Math.max(layer.energyShape - last.energyShape, 0)), layer });
  };
  for (let beta = MOST_BETA; beta > 0.5; beta *= 0.7) {
    const nodes = similarBranch(beta, wall, "attached");
    if (nodes.ok) add(nodes.nodes, 1);
  }
  const plate = similarBranch(0.45, wall, "attached");
  let from: SimilarNodes | null = plate.ok ? plate.nodes : null;
  const low = from ? similarQuantities(0, wall, from).defect : last.defect / 2;
  for (let k = 0; from && k < count; k += 1) {
    const solved = solveSimilarNodes(from, wall, { defect: low + ((last.defect - low) * k) / count });
    if (!solved.ok) break;
    from = solved.nodes;
    if (from.beta > last.beta && from.y[2] > 0) add(from, 1);
  }
  layers.push({ w: 0, layer: last });
  from = verge.nodes;
  for (let k = 1; k <= count / 2; k += 1) {
    const solved = solveSimilarNodes(from, wall, { defect: last.defect * (1 + (REVERSED * k) / (count / 2)) });
    if (!solved.ok) break;
    from = solved.nodes;
    add(from, -1);
  }
  return { wall, verge: last, layers };
}
