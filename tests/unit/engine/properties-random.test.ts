/*
 * Whatever a method is given, it answers: a finite result or a refusal that names a field; it never throws, never loops, never
 * prints a figure that is none. 20 000 random inputs here; ENGINE_RANDOM_INPUTS=200000 for the long run.
 */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { METHODS } from '@engine/catalog';
import { type Worked } from '@engine/sheet';
import { inputsFor } from './properties-random';

const TOTAL = Number(process.env['ENGINE_RANDOM_INPUTS'] ?? 20_000);
const SEED = Number(process.env['ENGINE_RANDOM_SEED'] ?? 20261201);
const EACH = Math.ceil(TOTAL / METHODS.length);
/** The slowest a single sheet may be on a busy machine, ms: a nozzle takes a few, an endless loop for ever. */
const SLOWEST = 3000;
const NO_FIGURE = /NaN|Infinity|undefined|\[object/;

/** What is wrong with an answer; empty when nothing is. */
function faults({ steps, outputs, refused, warnings }: Worked): string[] {
  const wrong: string[] = [];
  for (const [name, value] of Object.entries(outputs)) {
    if (typeof value === 'object' && !Number.isFinite(value.value))
      wrong.push(`output ${name} is ${value.value}`);
    if (typeof value === 'object' && (typeof value.unit !== 'string' || value.unit === ''))
      wrong.push(`output ${name} has no unit`);
  }
  for (const step of steps) {
    if (typeof step.value === 'number' && !Number.isFinite(step.value))
      wrong.push(`step ${step.symbol} is ${step.value}`);
    if (NO_FIGURE.test(step.tex) || NO_FIGURE.test(step.worked))
      wrong.push(`step ${step.symbol} prints ${step.worked}`);
  }
  if (
    refused &&
    !(refused.code && /\w{3}/.test(refused.text) && typeof refused.field === 'string' && refused.field !== '')
  )
    wrong.push(`refusal ${JSON.stringify(refused)}`);
  for (const { text } of warnings) if (NO_FIGURE.test(text)) wrong.push(`warning: ${text}`);
  return wrong;
}

/** Results that were not refused, by method. */
const worked = new Map<string, number>();

describe(`${TOTAL} random inputs`, () => {
  it.each(METHODS.map((method) => [method.id, method] as const))(
    '%s answers each of its share',
    (_id, method) => {
      let results = 0;
      fc.assert(
        fc.property(inputsFor(method), (inputs) => {
          const start = performance.now();
          const answer = method.work(inputs);
          expect(performance.now() - start).toBeLessThan(SLOWEST);
          expect(faults(answer)).toEqual([]);
          if (!answer.refused) results += 1;
        }),
        { numRuns: EACH, seed: SEED },
      );
      worked.set(method.id, results);
    },
    600_000,
  );

  it('are not all refused: most methods gave results among them', () => {
    const silent = METHODS.map(({ id }) => id).filter((id) => (worked.get(id) ?? 0) === 0);
    expect(silent.length, silent.join(', ')).toBeLessThan(METHODS.length / 10);
  });
});
