/* How often something can be done in a second of processor time: other programs on the machine do not count. */

/** Processor seconds spent by this process so far. */
function spent(): number {
  const { user, system } = process.cpuUsage();
  return (user + system) / 1e6;
}

const SLICE = 0.06;
const SLICES = 5;

/** One slice of time: calls in it, by the processor's clock. `batch` grows until a look at the clock costs nothing. */
function slice(work: (i: number) => unknown, batch: number): { rate: number; batch: number } {
  const start = spent();
  let count = 0;
  let size = batch;
  let used = 0;
  while (used < SLICE) {
    for (let i = 0; i < size; i += 1) work(count + i);
    count += size;
    used = spent() - start;
    if (used < SLICE / 20) size *= 2;
  }
  return { rate: count / used, batch: size };
}

/** Calls a second of processor time: the best of some slices, after one that only warms up. */
export function ratePerSecond(work: (i: number) => unknown): number {
  let { batch } = slice(work, 1);
  let best = 0;
  for (let n = 0; n < SLICES; n += 1) {
    const found = slice(work, batch);
    best = Math.max(best, found.rate);
    ({ batch } = found);
  }
  return best;
}

/** What was computed lands here, so that no compiler can leave the work out. */
export const sink = { total: 0 };

/** A figure into the sink. */
export function drain(value: number): void {
  sink.total += value;
}
