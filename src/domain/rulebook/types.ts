/* What a rule is, what it reads and what it says. */
import { type Basis, type Hash, type Path } from '@domain/basis';
import { type CredibleAnswer, type Evaluation, type ImportSet, type Lookup } from '@domain/evaluate';
import { type JudgementRules } from '@domain/rules';
import { type Q } from '@engine/quantity';

/** stop: the gate cannot open. justify: only with a written justification tied to the outcome. note: shown, never blocks. */
export type Severity = 'stop' | 'justify' | 'note';
/** The stage that is left at the gate where a rule is first asked. */
export type RuleGate =
  'draft' | 'scenarios' | 'check' | 'approval' | 'field' | 'removal' | 'in-kind' | 'watch';
export type RuleSubject =
  'equipment' | 'device' | 'group' | 'inlet line' | 'outlet line' | 'scenario' | 'fluid' | 'case' | 'any';

export type Judged = { doc: Basis; evaluation: Evaluation };

/** What a document rule reads: the basis with its evaluation, the basis in force before, imports and the site's judgement. */
export type RuleContext = Judged & {
  prior?: Judged;
  imports: ImportSet;
  rules: JudgementRules;
  lookup: Lookup;
  answers: readonly CredibleAnswer[];
};

/** One failing of a rule. `worse` grows as the failing grows and decides whether an old one was inherited. */
export type Hit = {
  subject: Path;
  tag: string;
  values: Record<string, Q | string>;
  severity?: Severity;
  /** Added to the sentence, when the rule has something more to say. */
  more?: string;
  /** The field to go to, where it is not the subject itself. */
  field?: Path;
  worse?: number;
};

export type RuleFacts = {
  code: string;
  subject: RuleSubject;
  /** As the user reads it, with {placeholders} that the values of a hit fill. */
  statement: string;
  /** When it speaks, in words. */
  condition: string;
  severity: Severity;
  gate: RuleGate;
  /** Where it is from. M from memory, P common practice without a source, S seen in a public source. */
  source: string;
  /** Key of the site's parameter, where a site may change it. */
  parameter?: string;
  /** False for rules that no outcome of the basis in force excuses. */
  inheritable?: false;
};
export type Rule = RuleFacts & { work(ctx: RuleContext): Hit[] };

/** What a rule says about a subject; `hash` is what a justification binds. */
export type Outcome = {
  code: string;
  subject: Path;
  tag: string;
  sentence: string;
  where: string;
  severity: Severity;
  values: Record<string, Q | string>;
  inherited: boolean;
  hash: Hash;
};

/** Joins the facts of a rule and its function. */
export function rule(facts: RuleFacts, work: (ctx: RuleContext) => Hit[]): Rule {
  return { ...facts, work };
}
