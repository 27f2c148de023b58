/* A value as a document of cases writes it. */

/** A value with its unit, as the reference cases write it: a number, a word, a flag, or a list of numbers. */
export type CalcValue = {
  value: number | string | boolean | null | readonly (number | string | boolean)[];
  unit?: string;
};
