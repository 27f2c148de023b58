/* What a method of the engine says about itself and how it is worked. */
import { type Dimension } from '../quantity';
import { type Inputs, type Worked } from '../sheet/types';

/**
 * One input of a method; `words` lists the allowed words of a choice; `rangeKey` names a row of the ranges of inputs;
 * `each` says of what a numbered input (`flow`, `flow_2`, `flow_3` …) is given once for each.
 */
export type MethodInput = {
  name: string;
  meaning: string;
  dimension?: Dimension;
  rangeKey?: string;
  each?: string;
  words?: string[];
  required: boolean;
};

/** One output of a method. */
export type MethodOutput = { name: string; meaning: string; dimension?: Dimension };

/** A calculation method: numbered, sourced, with its range of validity; `work` never throws on bad input, it refuses. */
export type Method = {
  id: string;
  version: number;
  topic: string;
  title: string;
  editions: string[];
  source: string;
  validity: string;
  inputs: MethodInput[];
  outputs: MethodOutput[];
  work(inputs: Inputs, edition?: string): Worked;
};
