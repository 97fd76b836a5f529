import { brentRoot } from "../../../src/numerics/brent-root";
import { gaussLegendre } from "../../../src/numerics/gauss-legendre";

/** An edge speed known as a formula. */
export interface Flow {
  name: string;
  ue: (x: number) => number;
  slope: (x: number) => number;
  /** A place before which the method's separation is known to lie. */
  before: number;
  /** Radius of a round body, where there is one. */
  radius?: (x: number) => number;
}

/** The decelerating flows of the literature on laminar separation. */
export const CLASSIC_FLOWS: readonly Flow[] = [
  { name: "1 − x (Howarth 1938)", ue: (x) => 1 - x, slope: () => -1, before: 0.2 },
  ...[2, 4, 8].map((n) => ({ name: `1 − x^${n} (Tani 1949)`, ue: (x: number) => 1 - x ** n, slope: (x: number) => -n * x ** (n - 1), before: 0.8 })),
  { name: "cos x", ue: Math.cos, slope: (x) => -Math.sin(x), before: 0.6 },
  { name: "sin x", ue: Math.sin, slope: Math.cos, before: 2 },
  {
    name: "1.8150x − 0.2714x³ − 0.0471x⁵ (Hiemenz 1911)",
    ue: (x) => 1.815 * x - 0.2714 * x ** 3 - 0.0471 * x ** 5,
    slope: (x) => 1.815 - 3 * 0.2714 * x ** 2 - 5 * 0.0471 * x ** 4,
    before: 1.55,
  },
];

function rule(): { node: Float64Array; weight: Float64Array } {
  const made = gaussLegendre(60);
  if (!made.ok) throw new Error(made.reason);
  return made;
}
const { node, weight } = rule();

/** θ²∕ν of Thwaites' method straight from the formula of the flow, by 60-node quadrature from 0 to x: the method's exact value. */
export function exactGrowth(flow: Flow, x: number): number {
  const integrand = (s: number): number => (flow.radius ? flow.radius(s) ** 2 : 1) * flow.ue(s) ** 5;
  let sum = 0;
  for (let k = 0; k < node.length; k += 1) sum += weight[k] * integrand((x * (1 + node[k])) / 2);
  return (0.45 * sum * x) / 2 / ((flow.radius ? flow.radius(x) ** 2 : 1) * flow.ue(x) ** 6);
}

/** The station where λ of the method is −0.09, from the formula of the flow. */
export function exactSeparation(flow: Flow): number {
  const root = brentRoot((x) => exactGrowth(flow, x) * flow.slope(x) + 0.09, 1e-3, flow.before);
  if (!root.ok) throw new Error(root.reason);
  return root.x;
}

/** n stations from `from` to `to`. */
export function spaced(n: number, from: number, to: number): Float64Array {
  return Float64Array.from({ length: n }, (_, i) => from + ((to - from) * i) / (n - 1));
}
