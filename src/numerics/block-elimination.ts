/**
 * Gaussian elimination with row exchange for a chain of nodes of which each is tied only to the next: the linear system of a
 * two-point boundary-value problem on a grid (Keller's "block elimination"). Rows are handed over one interval at a time and are
 * not kept whole, so that the caller assembles and eliminates in one sweep.
 *
 * Use: fill the first `left` rows with the conditions at the first node and call `begin`; for every interval fill rows
 * `left … left+n−1` and call `push`; fill rows `left … n−1` with the conditions at the last node and call `finish`.
 * A row holds the n coefficients of the near node, the n of the far node, then the right-hand side.
 *
 * Source: H. B. Keller, "Accurate difference methods for two-point boundary value problems", SIAM J. Numer. Anal. 11 (1974) 305–320
 * (mixed partial pivoting for separated end conditions; from memory).
 */
export interface BlockElimination {
  /** The working rows, `left + n` of them, each `width` long. */
  readonly rows: Float64Array;
  /** Length of one row: 2n + 1. */
  readonly width: number;
  /** First row the caller fills for an interval, and for the last node: `left`. */
  readonly left: number;
  /** Unknowns of all nodes after `finish`, node by node. */
  readonly solution: Float64Array;
  /** Starts a sweep; call after the first `left` rows hold the conditions at the first node. */
  begin(): void;
  /** Eliminates the near node of the interval just filled in; false when the rows do not determine it. */
  push(): boolean;
  /** Solves the last node and goes back through the chain; false when the rows do not determine it. */
  finish(): boolean;
}

/**
 * @param n unknowns a node, ≥ 1
 * @param left conditions at the first node, 0 … n (the last node then has n − left)
 * @param mostNodes nodes of the longest chain, ≥ 2
 */
export function blockElimination(n: number, left: number, mostNodes: number): BlockElimination {
  const width = 2 * n + 1;
  const tall = left + n;
  const rows = new Float64Array(tall * width);
  const kept = new Float64Array(mostNodes * n * width);
  const solution = new Float64Array(mostNodes * n);
  let node = 0;

  /** Makes the first n columns upper triangular over `count` rows; entries past `last` columns are left alone. */
  function triangulate(count: number): boolean {
    for (let c = 0; c < n; c += 1) {
      let best = c;
      let size = Math.abs(rows[c * width + c]);
      for (let r = c + 1; r < count; r += 1) {
        const other = Math.abs(rows[r * width + c]);
        if (other > size) {
          size = other;
          best = r;
        }
      }
      if (!(size > 0) || size === Infinity) return false;
      const at = c * width;
      if (best !== c) {
        const from = best * width;
        for (let k = c; k < width; k += 1) {
          const hold = rows[at + k];
          rows[at + k] = rows[from + k];
          rows[from + k] = hold;
        }
      }
      const pivot = 1 / rows[at + c];
      for (let r = c + 1; r < count; r += 1) {
        const to = r * width;
        if (rows[to + c] === 0) continue;
        const factor = rows[to + c] * pivot;
        for (let k = c + 1; k < width; k += 1) rows[to + k] -= factor * rows[at + k];
      }
    }
    return true;
  }

  return {
    rows,
    width,
    left,
    solution,
    begin() {
      node = 0;
    },
    push() {
      if (!triangulate(tall)) return false;
      const at = node * n * width;
      for (let k = 0; k < n * width; k += 1) kept[at + k] = rows[k];
      for (let r = 0; r < left; r += 1) {
        const from = (n + r) * width;
        const to = r * width;
        for (let k = 0; k < n; k += 1) {
          rows[to + k] = rows[from + n + k];
          rows[to + n + k] = 0;
        }
        rows[to + 2 * n] = rows[from + 2 * n];
      }
      node += 1;
      return true;
    },
    finish() {
      for (let r = left; r < n; r += 1) for (let k = n; k < 2 * n; k += 1) rows[r * width + k] = 0;
      if (!triangulate(n)) return false;
      back(rows, 0, node, solution, n, width, false);
      for (let j = node - 1; j >= 0; j -= 1) back(kept, j * n * width, j, solution, n, width, true);
      return true;
    },
  };
}

/** Solves the upper triangle of one node, the next node being known. */
function back(rows: Float64Array, at: number, node: number, y: Float64Array, n: number, width: number, hasNext: boolean): void {
  const here = node * n;
  for (let i = n - 1; i >= 0; i -= 1) {
    const row = at + i * width;
    let sum = rows[row + 2 * n];
    for (let k = i + 1; k < n; k += 1) sum -= rows[row + k] * y[here + k];
    if (hasNext) for (let k = 0; k < n; k += 1) sum -= rows[row + n + k] * y[here + n + k];
    y[here + i] = sum / rows[row + i];
  }
}
