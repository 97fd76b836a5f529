import { brentRoot } from "../../numerics/brent-root";
import { refuse, type Outcome } from "../../numerics/outcome";
import { panelValue, type PiecewiseCubic } from "../../numerics/piecewise-cubic";

/**
 * Height at which the speed first reaches a fraction of the edge speed, by root finding on the profile's curve.
 *
 * @param profile speed over height, from the wall outward
 * @param edge edge speed over height on the same knots
 * @param fraction 0 < fraction < 1
 * @returns height [length]; refused ("no edge found") where the profile never reaches it
 */
export function layerHeight(profile: PiecewiseCubic, edge: PiecewiseCubic, fraction: number): Outcome<{ height: number }> {
  const { x } = profile;
  for (let i = 0; i + 1 < x.length; i++) {
    if (profile.value[i + 1]! < fraction * edge.value[i + 1]!) continue;
    const lack = (t: number) => panelValue(profile, i, t) - fraction * panelValue(edge, i, t);
    if (lack(0) >= 0) return { ok: true, height: x[i]! };
    const root = brentRoot(lack, 0, 1);
    return root.ok ? { ok: true, height: x[i]! + root.x * (x[i + 1]! - x[i]!) } : root;
  }
  return refuse("no edge found", { argument: "u", values: { fraction } });
}
