/* What a calculation sheet is made of: steps that can be re-worked by hand, warnings and refusals. */
import { type Q } from '../quantity';

/** One line of a sheet: symbol, meaning, equation and substitution in TeX, result with unit, clause. */
export type Step = {
  symbol: string;
  meaning: string;
  tex: string;
  worked: string;
  value: number | string;
  unit: string;
  clause?: string;
  /** True when the constant or clause was written from memory of the standard, whose text was not at hand. */
  memory?: boolean;
};

/** Something the reader must know although a result exists; `range` names the range that was left. */
export type SheetWarning = { code: string; text: string; range?: string };

/** Why no result exists, in a practitioner's sentence, and which input it is about. */
export type Refusal = { code: string; text: string; field: string };

/** Named inputs and outputs of a method. */
export type Inputs = Record<string, Q | string | boolean>;

/** A worked sheet. With `refused`, outputs are those found before the refusal, and no result may be used. */
export type Worked = {
  method: string;
  edition?: string;
  steps: Step[];
  outputs: Inputs;
  warnings: SheetWarning[];
  refused?: Refusal;
};
