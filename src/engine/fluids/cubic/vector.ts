/* Small helpers on arrays of numbers: reading with a known index, and solving a small linear system. */

/** The element at an index that the caller knows to be inside. */
export function at(a: ArrayLike<number>, i: number): number {
  return a[i] as number;
}

/** Σ a_i b_i over the first `n` elements. */
export function dot(a: ArrayLike<number>, b: ArrayLike<number>, n: number): number {
  let sum = 0;
  for (let i = 0; i < n; i += 1) sum += at(a, i) * at(b, i);
  return sum;
}

function largestRow(A: Float64Array, n: number, column: number): number {
  let best = column;
  for (let row = column + 1; row < n; row += 1)
    if (Math.abs(at(A, row * n + column)) > Math.abs(at(A, best * n + column))) best = row;
  return best;
}

function swapRows(A: Float64Array, b: Float64Array, n: number, one: number, other: number): void {
  if (one === other) return;
  for (let j = 0; j < n; j += 1) {
    const kept = at(A, one * n + j);
    A[one * n + j] = at(A, other * n + j);
    A[other * n + j] = kept;
  }
  const kept = at(b, one);
  b[one] = at(b, other);
  b[other] = kept;
}

/** Solves A x = b (n × n by rows) by elimination with pivots, in place: x is left in b. False when singular. */
export function solveLinear(A: Float64Array, b: Float64Array, n: number): boolean {
  for (let k = 0; k < n; k += 1) {
    swapRows(A, b, n, k, largestRow(A, n, k));
    const pivot = at(A, k * n + k);
    if (!(Math.abs(pivot) > 1e-300)) return false;
    for (let row = k + 1; row < n; row += 1) {
      const factor = at(A, row * n + k) / pivot;
      if (factor === 0) continue;
      for (let j = k + 1; j < n; j += 1) A[row * n + j] = at(A, row * n + j) - factor * at(A, k * n + j);
      b[row] = at(b, row) - factor * at(b, k);
    }
  }
  for (let row = n - 1; row >= 0; row -= 1) {
    let sum = at(b, row);
    for (let j = row + 1; j < n; j += 1) sum -= at(A, row * n + j) * at(b, j);
    b[row] = sum / at(A, row * n + row);
  }
  return b.every(Number.isFinite);
}
