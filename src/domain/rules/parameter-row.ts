/* One parameter of the rulebook that a site may change, within bounds. */

export type ParameterValue = number | string | boolean;
/** Least and most for a number; the words to choose from for a word; nothing for yes or no. */
export type Bounds = readonly [number, number] | readonly string[] | undefined;

/**
 * `half`: judgement enters results, outcomes and therefore signatures; conduct (dates, reminders, counts of people)
 * does not. `default` is what a site has until it says otherwise.
 */
export type Parameter = {
  key: string;
  meaning: string;
  unit: string;
  default: ParameterValue;
  bounds: Bounds;
  source: string;
  half: 'judgement' | 'conduct';
};

type Row = readonly [
  key: string,
  meaning: string,
  unit: string,
  initial: ParameterValue,
  bounds: Bounds,
  source: string,
];

/** Turns rows into parameters of one half. */
export function parametersOf(half: Parameter['half'], rows: readonly Row[]): Parameter[] {
  return rows.map(([key, meaning, unit, initial, bounds, source]) => ({
    key,
    meaning,
    unit,
    default: initial,
    bounds,
    source,
    half,
  }));
}
