/**
 * Makes src/physics/laminar/similar-closure-fit.ts from the similar layers: npx tsx test/physics/laminar/make-similar-closure.ts
 * It prints how well the fit meets the layers it was made from.
 */
import { writeFileSync } from "node:fs";
import path from "node:path";
import { chebyshevRow } from "../../../src/physics/laminar/similar-closure";
import { closureFamily } from "./similar-closure-samples";

const WALLS = [-0.77, -0.74, -0.7, -0.66, -0.6, -0.5, -0.4, -0.3, -0.2, -0.12, -0.06, -0.03, 0, 0.03, 0.06, 0.12, 0.2, 0.3, 0.42, 0.56, 0.75, 1, 1.3, 1.7, 2.2, 2.8, 3.5];
const LAYERS = 24;
const VERGE_DEGREE = 12;
const DEGREES = [9, 6] as const;
const RANGE = { leastW: -0.15, mostW: 0.38, leastR: -1, mostR: 0.6 };
/** A solid wall is the usual case: its layers weigh this much more. */
const SOLID_WEIGHT = 4;

const families = WALLS.map((wall) => closureFamily(wall, LAYERS)).filter((family) => family !== null);
const scaled = (value: number, least: number, most: number): number => (2 * value - least - most) / (most - least);
const row = (degree: number, value: number): number[] => Array.from(chebyshevRow(degree, value, new Float64Array(degree + 1)));
const verge = leastSquares(
  families.map((f) => row(VERGE_DEGREE, scaled(f.verge.wallFlow, RANGE.leastR, RANGE.mostR))),
  families.map((f) => f.verge.energyShape),
);
const vergeAt = (wallFlow: number): number => dot(row(VERGE_DEGREE, scaled(wallFlow, RANGE.leastR, RANGE.mostR)), verge);
const samples = families
  .flatMap((f) => f.layers.map(({ w, layer }) => ({ w: Math.sign(w) * Math.sqrt(Math.max(layer.energyShape - vergeAt(layer.wallFlow), 0)), layer })))
  .filter(({ w, layer }) => w > RANGE.leastW && w < RANGE.mostW && layer.wallFlow > RANGE.leastR && layer.wallFlow < RANGE.mostR);
const terms = samples.map(({ w, layer }) => {
  const a = row(DEGREES[0], scaled(w, RANGE.leastW, RANGE.mostW));
  const b = row(DEGREES[1], scaled(layer.wallFlow, RANGE.leastR, RANGE.mostR));
  return a.flatMap((p) => b.map((q) => p * q));
});
const weight = samples.map(({ layer }) => (layer.wallFlow === 0 ? SOLID_WEIGHT : 1));
const targets = { shear: samples.map((s) => s.layer.shear), dissipation: samples.map((s) => s.layer.dissipation), inverseShape: samples.map((s) => 1 / s.layer.shape) };
const lines: string[] = [];
for (const [name, wanted] of Object.entries(targets)) {
  const fit = leastSquares(terms.map((t, i) => t.map((v) => v * weight[i])), wanted.map((v, i) => v * weight[i]));
  const miss = terms.map((t, i) => Math.abs(dot(t, fit) - wanted[i]));
  const solid = miss.filter((_, i) => samples[i].layer.wallFlow === 0);
  console.log(`${name}: largest miss ${Math.max(...miss).toExponential(1)}, on a solid wall ${Math.max(...solid).toExponential(1)}, ${samples.length} layers`);
  lines.push(`  ${name}: [${fit.map((v) => Number(v.toPrecision(9))).join(", ")}],`);
}
const text = `/** Made by test/physics/laminar/make-similar-closure.ts from ${samples.length} similar layers; not written by hand. See similar-closure.ts. */
export const CLOSURE_FIT = {
  leastW: ${RANGE.leastW},
  mostW: ${RANGE.mostW},
  leastR: ${RANGE.leastR},
  mostR: ${RANGE.mostR},
  degreeW: ${DEGREES[0]},
  degreeR: ${DEGREES[1]},
  verge: [${verge.map((v) => Number(v.toPrecision(10))).join(", ")}],
${lines.join("\n")}
} as const;
`;
writeFileSync(path.join(__dirname, "../../../src/physics/laminar/similar-closure-fit.ts"), text);

function dot(a: readonly number[], b: readonly number[]): number {
  return a.reduce((sum, v, i) => sum + v * b[i], 0);
}

/** Least squares by Householder's reflections. */
function leastSquares(matrix: number[][], right: number[]): number[] {
  const a = matrix.map((r, i) => [...r, right[i]]);
  const n = matrix[0].length;
  for (let k = 0; k < n; k += 1) {
    const size = Math.sqrt(a.slice(k).reduce((sum, r) => sum + r[k] * r[k], 0)) * (a[k][k] > 0 ? -1 : 1);
    const v = a.slice(k).map((r) => r[k]);
    v[0] -= size;
    const norm = v.reduce((sum, x) => sum + x * x, 0);
    for (let c = k; c <= n; c += 1) {
      const factor = (2 * v.reduce((sum, x, i) => sum + x * a[k + i][c], 0)) / norm;
      v.forEach((x, i) => (a[k + i][c] -= factor * x));
    }
  }
  const out = new Array<number>(n).fill(0);
  for (let k = n - 1; k >= 0; k -= 1) out[k] = (a[k][n] - out.slice(k + 1).reduce((sum, x, i) => sum + x * a[k][k + 1 + i], 0)) / a[k][k];
  return out;
}
