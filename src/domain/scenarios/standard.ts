/* What a standard scenario says of itself, and the small words with which the list is written down. */
import { STATUSES, type Status } from '@domain/basis/figures';
import type { Equipment } from '@domain/basis/equipment';
import type { Utility } from '@domain/basis/registers';
import type { Accumulation, Disposition } from '@domain/basis/scenarios';
import type { LoadWays } from './load-ways';

/** A sentence to start a reason from; {placeholders} are still to be filled in. */
export type StartingSentence = { disposition: Exclude<Disposition, 'credible'>; text: string };

/**
 * A standard cause of overpressure or vacuum as it is written down, without its load. `accumulation` is what its answers start from (absent: not answered by
 * relief); `headerCommon` whether it adds to other systems at a header; `conditions` what it may depend on in the field.
 */
export type WrittenScenario = {
  key: string;
  name: string;
  question: string;
  kinds: readonly Equipment['kind'][];
  statuses: readonly Status[];
  sentences: readonly StartingSentence[];
  state: string;
  accumulation?: Accumulation;
  headerCommon: 'no' | 'yes' | 'possible';
  headerNote: string;
  utility?: Utility['kind'];
  conditions: readonly string[];
};

/** A standard cause with the ways in which its load is found. */
export type StandardScenario = WrittenScenario & { load: LoadWays };

export const ALL: readonly Status[] = STATUSES;

const LETTERS: Readonly<Record<string, readonly Equipment['kind'][]>> = {
  V: ['vessel', 'filter'],
  C: ['column'],
  X: ['exchanger'],
  D: ['drum'],
  P: ['pump'],
  K: ['compressor'],
  T: ['storage-tank'],
  L: ['piping'],
  H: ['fired-heater', 'boiler'],
  R: ['reactor'],
};

/** Kinds of equipment by the trade's letters ("V C X"). */
export function kinds(letters: string): readonly Equipment['kind'][] {
  return letters.split(' ').flatMap((letter) => LETTERS[letter] ?? []);
}

/** A starting sentence of a disposition. */
export function say(disposition: StartingSentence['disposition'], text: string): StartingSentence {
  return { disposition, text };
}
