/* The shape of an evaluation: sheets, verdicts, flat figures, and what a header lends to a basis. */
import { type Q } from '@engine/quantity';
import { type Inputs, type SheetWarning, type Step } from '@engine/sheet';
import { type Hash, type Id, type Path, type Segment } from '@domain/basis';

/** `limit|load|size:<scenario>/<answer>` · `rated|inlet|outlet|cold|force:<point>`. */
export type SheetKey = string;

/** Why a sheet has no result: a code, a sentence for the user, and the field that would mend it. */
export type SheetRefusal = { code: string; text: string; field: Path };

/** One calculation with its resolved inputs, where each came from, its steps and its results. */
export type Sheet = {
  key: SheetKey;
  method: string;
  edition?: string;
  inputs: Inputs;
  from: Record<string, Path>;
  steps: Step[];
  hash: Hash;
  outputs: Inputs;
  warnings: SheetWarning[];
  refused?: SheetRefusal;
};

/** What a sheet, a group or a relief point comes to; never said of a person. */
export type Verdict = 'adequate' | 'marginal' | 'inadequate' | 'not-sized';

/**
 * What pinned header revisions lend to a basis: the way from its node to the tip, the viscosity of what flows there where the
 * header states one, and the pressures at that node.
 */
export type HeaderImport = {
  revision: number;
  network: Segment[];
  normal: Q;
  viscosity?: Q;
  causes: Record<Id, { at: Q; flow: Q; T?: Q }>;
};
export type ImportSet = { headers: Record<Id, HeaderImport>; loads: Record<Id, Q> };

export type GroupResult = { governing?: SheetKey; use?: number; verdict: Verdict };
export type PointResult = { rated?: Q; inletLoss?: Q; builtUp?: Q; total?: Q; verdict: Verdict };

/** Everything that follows from a basis, the judgement half of the site rules and its imports. */
export type Evaluation = {
  key: Hash;
  engine: string;
  methods: string[];
  sheets: Record<SheetKey, Sheet>;
  groups: Record<Id, GroupResult>;
  points: Record<Id, PointResult>;
  figures: Record<Path, Q | string>;
  nodes?: Record<Id, Record<Id, Q>>;
};

/** An import set without headers, for systems that discharge to none. */
export const NO_IMPORTS: ImportSet = { headers: {}, loads: {} };
