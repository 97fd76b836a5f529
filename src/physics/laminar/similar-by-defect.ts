import { brentRoot } from "../../numerics/brent-root";
import type { Outcome } from "../../numerics/outcome";
import { refuse } from "../../numerics/outcome";
import { similarBranch } from "./similar-branch";
import type { SimilarNodes } from "./similar-equations";
import { solveSimilarNodes } from "./similar-equations";
import type { SimilarLayer } from "./similar-layer";
import { similarQuantities } from "./similar-layer";

/** Defect thickness in η of the layers at the ends of the search: β = 2 and the verge of separation (own solutions). */
const THINNEST = 0.4974336785;
const THICKEST = 2.358846277;
/** The flat plate's, and the ratio of one layer's to the next on the way. */
const PLATE = 1.216780622;
const STRIDE = 1.13;
/** λ and H of the same two layers. */
export const SIMILAR_GRADIENTS = { least: -0.06814825, most: 0.1065221 } as const;
export const SIMILAR_SHAPES = { least: 2.155412, most: 4.029226 } as const;
/** Close enough: the change of H that is left is below 1e-9. */
const TOLERANCE = 1e-10;

/** The attached similar layer on a solid wall that has a given λ = θ² ue′∕ν, or a given H; refused outside β = −0.1988 … 2. */
export function similarByDefect(wanted: { gradient: number } | { shape: number }): Outcome<{ layer: SimilarLayer }> {
  const byShape = "shape" in wanted;
  const value = byShape ? wanted.shape : wanted.gradient;
  const range = byShape ? SIMILAR_SHAPES : SIMILAR_GRADIENTS;
  if (!(value >= range.least && value <= range.most)) {
    return refuse("outside range", { argument: byShape ? "start shape" : "start momentum loss (as λ)", values: { value, ...range } });
  }
  const plate = similarBranch(0, 0, "attached");
  if (!plate.ok) return plate;
  let nodes: SimilarNodes = plate.nodes;
  let bad: Outcome<{ nodes: SimilarNodes }> | null = null;
  const excess = (defect: number): number => {
    const solved = solveSimilarNodes(nodes, 0, { defect });
    if (!solved.ok) {
      bad = solved;
      return NaN;
    }
    nodes = solved.nodes;
    const layer = similarQuantities(0, 0, nodes);
    return byShape ? layer.shape - value : value - layer.gradient;
  };
  // Thicker layers have the higher H and the lower λ: walk from the flat plate towards the wanted one until it is passed.
  let near = PLATE;
  let there = excess(near);
  const outwards = there < 0;
  for (let far = near; ; near = far) {
    far = outwards ? Math.min(near * STRIDE, THICKEST) : Math.max(near / STRIDE, THINNEST);
    there = excess(far);
    if (bad) return bad;
    if (there >= 0 === outwards || far === THICKEST || far === THINNEST) {
      const root = brentRoot(excess, near, far, TOLERANCE);
      if (!root.ok) return bad ?? root;
      return { ok: true, layer: similarQuantities(nodes.beta / (2 - nodes.beta), 0, nodes) };
    }
  }
}
