/* The sheet forms: one case a topic from the check values, worked as the command line works it. */
import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { calculate, type CalcRequest } from '@engine/calc';
import { methodById } from '@engine/catalog';
import { drain } from './measure';

const FOLDER = join(import.meta.dirname, '../../reference');

/** The first check case of every topic that the engine works. */
function firstCases(): Map<string, CalcRequest> {
  const found = new Map<string, CalcRequest>();
  for (const name of readdirSync(FOLDER).filter((one) => one.endsWith('.json'))) {
    const { cases } = JSON.parse(readFileSync(join(FOLDER, name), 'utf8')) as { cases?: unknown };
    for (const one of Array.isArray(cases) ? (cases as CalcRequest[]) : [])
      if (!found.has(one.topic) && methodById(one.topic)) found.set(one.topic, one);
  }
  return found;
}

/** Sheets by topic. A number of the inputs moves a little from call to call. */
export function sheetForms(): Map<string, (i: number) => void> {
  return new Map(
    [...firstCases()].map(([topic, { inputs }]) => {
      const moved = Object.entries(inputs).find(([, { value }]) => typeof value === 'number' && value !== 0);
      return [
        topic,
        (i: number) => {
          const [name = '', given = { value: 0 }] = moved ?? [];
          const value = Number(given.value) * (1 + (i % 1000) * 1e-7);
          const answer = calculate({
            topic,
            inputs: moved ? { ...inputs, [name]: { ...given, value } } : inputs,
          });
          drain(answer.warnings.length + (answer.steps?.length ?? 0));
        },
      ];
    }),
  );
}
