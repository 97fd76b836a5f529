import fc from "fast-check";
import { blockElimination } from "../../src/numerics/block-elimination";

/** Solves a whole dense system by Gauss–Jordan with full row pivoting: the second method. */
function dense(a: number[][], b: number[]): number[] {
  const m = a.map((row, i) => [...row, b[i]]);
  const n = b.length;
  for (let c = 0; c < n; c += 1) {
    let best = c;
    for (let r = c + 1; r < n; r += 1) if (Math.abs(m[r][c]) > Math.abs(m[best][c])) best = r;
    [m[c], m[best]] = [m[best], m[c]];
    for (let r = 0; r < n; r += 1) {
      if (r === c) continue;
      const f = m[r][c] / m[c][c];
      for (let k = c; k <= n; k += 1) m[r][k] -= f * m[c][k];
    }
  }
  return m.map((row, i) => row[n] / row[i]);
}

/** Numbers that repeat, from a seed. */
function numbers(seed: number): () => number {
  let s = seed;
  return () => {
    s = (s * 1103515245 + 12345) % 2147483648;
    return s / 1073741824 - 1;
  };
}

function both(n: number, left: number, nodes: number, seed: number): { chain: number[]; whole: number[] } | null {
  const next = numbers(seed);
  const size = n * nodes;
  const whole: number[][] = [];
  const right: number[] = [];
  const chain = blockElimination(n, left, nodes);
  const { rows, width } = chain;
  const fill = (row: number, node: number, columns: number): void => {
    const line = new Array<number>(size).fill(0);
    for (let k = 0; k < 2 * n; k += 1) {
      const value = k < columns ? next() + (k % n === row % n ? 1.5 : 0) : 0;
      rows[row * width + k] = value;
      if (k < columns) line[node * n + k] = value;
    }
    rows[row * width + 2 * n] = next();
    whole.push(line);
    right.push(rows[row * width + 2 * n]);
  };
  for (let r = 0; r < left; r += 1) fill(r, 0, n);
  chain.begin();
  for (let j = 0; j + 1 < nodes; j += 1) {
    for (let r = 0; r < n; r += 1) fill(left + r, j, 2 * n);
    if (!chain.push()) return null;
  }
  for (let r = left; r < n; r += 1) fill(r, nodes - 1, n);
  if (!chain.finish()) return null;
  return { chain: Array.from(chain.solution), whole: dense(whole, right) };
}

describe("block elimination of a chain of nodes", () => {
  it("gives what a dense solution of the whole system gives, for any number of unknowns and end conditions", () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 5 }), fc.nat(), fc.integer({ min: 2, max: 7 }), fc.integer({ min: 1, max: 1e6 }), (n, l, nodes, seed) => {
        const got = both(n, l % (n + 1), nodes, seed);
        if (got === null) throw new Error("said to be undetermined");
        const size = Math.max(1, ...got.whole.map(Math.abs));
        got.whole.forEach((v, i) => expect(Math.abs(got.chain[i] - v)).toBeLessThan(1e-6 * size));
      }),
    );
  });
  it("says so when the rows do not determine the unknowns", () => {
    const chain = blockElimination(2, 1, 2);
    chain.rows.fill(0);
    chain.begin();
    expect(chain.push()).toBe(false);
  });
});
