/* A plant of many bases worked again: in this thread, and shared among worker threads, with progress. */
import { availableParallelism } from 'node:os';
import { Worker } from 'node:worker_threads';
import { evaluate } from '@domain/evaluate';
import { type Basis } from '@domain/basis';
import { basisOf, resultsOf, SITE } from '../../../seeds/convert';
import { importSetOf } from '../../../seeds/load/imports';
import { siteRules } from '../../../seeds/load/rules';

/** The bases of the plant from..to: the invented site over and over, each a document of its own. */
function basesOf(from: number, to: number): Basis[] {
  const own = SITE.systems.map((system) => basisOf(system, resultsOf(system.id)));
  return Array.from({ length: to - from }, (_, i): Basis => {
    const body = structuredClone(own[(from + i) % own.length] as Basis);
    return { ...body, id: `${body.id}x${from + i}`, tag: `${from + i}-${body.tag}` };
  });
}

/** Makes the bases from..to and then evaluates each: time by the clock and by the processor, s, and the number of sheets. */
export function workPlant(
  from: number,
  to: number,
  each: () => void,
): { seconds: number; processor: number; sheets: number } {
  const { judgement } = siteRules('2026-01-05');
  const bodies = basesOf(from, to).map((body) => ({ body, imports: importSetOf(body) }));
  let sheets = 0;
  const start = performance.now();
  const before = process.cpuUsage();
  for (const { body, imports } of bodies) {
    sheets += Object.keys(evaluate(body, judgement, imports).sheets).length;
    each();
  }
  const { user, system } = process.cpuUsage(before);
  return { seconds: (performance.now() - start) / 1000, processor: (user + system) / 1e6, sheets };
}

/** Registers the loader of TypeScript in a thread, and then runs its share. */
const START = `import('tsx/esm/api').then(({ register }) => {
  register();
  return import(${JSON.stringify(new URL('./plant-worker.ts', import.meta.url).href)});
});`;

/** The same shared among as many threads as there are cores; the time is that of the slowest, without their start. */
export async function workPlantShared(count: number, each: () => void): Promise<number> {
  const threads = availableParallelism();
  const share = Math.ceil(count / threads);
  const times = Array.from({ length: threads }, (_, i) => {
    const workerData = { from: i * share, to: Math.min(count, (i + 1) * share) };
    const worker = new Worker(START, { workerData, eval: true, execArgv: [] });
    return new Promise<number>((resolve, reject) => {
      worker.on('message', (told: 'one' | number) => (told === 'one' ? each() : resolve(told)));
      worker.on('error', reject);
    });
  });
  return Math.max(...(await Promise.all(times)));
}
