/* judge: every document rule asked of a basis, with what it inherited from the basis in force marked as such. */
import {
  type Basis,
  describePath,
  hashOf,
  type Justification,
  type Path,
  roundedForHash,
} from '@domain/basis';
import { credibleAnswers, type ImportSet, lookupOf } from '@domain/evaluate';
import { type JudgementRules } from '@domain/rules';
import { type Q, QuantityError } from '@engine/quantity';
import { RULEBOOK } from './rules';
import { fill } from './sentence';
import { type Hit, type Judged, type Outcome, type Rule, type RuleContext } from './types';

/** An old failing counts as inherited while it is worse by no more than this share. */
const NOT_WORSE = 0.005;

export type JudgeInput = Judged & { prior?: Judged; imports: ImportSet; rules: JudgementRules };

function contextOf(input: JudgeInput): RuleContext {
  const lookup = lookupOf(input.doc);
  return { ...input, lookup, answers: credibleAnswers(input.doc, lookup) };
}

/** A rule whose figures do not fit in their units says nothing: the rule on units speaks. */
function ask(rule: Rule, ctx: RuleContext): Hit[] {
  try {
    return rule.work(ctx);
  } catch (error) {
    if (error instanceof QuantityError || error instanceof RangeError) return [];
    throw error;
  }
}

/** The part of a page where the subject of an outcome is mended. */
export function whereOf(doc: Basis, path: Path): string {
  if (path.startsWith('sheets/')) return path;
  if (path.startsWith('methods/')) return 'sheets';
  return describePath(doc, path).where;
}

function hashable(values: Record<string, Q | string>): Record<string, unknown> {
  return Object.fromEntries(
    Object.entries(values).map(([name, value]) => [
      name,
      typeof value === 'string' ? value : { value: roundedForHash(value.value), unit: value.unit },
    ]),
  );
}

function outcomeOf(rule: Rule, hit: Hit, ctx: RuleContext, inherited: boolean): Outcome {
  const sentence = fill(rule.statement, hit.values);
  return {
    code: rule.code,
    subject: hit.subject,
    tag: hit.tag,
    sentence: hit.more === undefined ? sentence : `${sentence} ${hit.more}`,
    where: whereOf(ctx.doc, hit.field ?? hit.subject),
    severity: hit.severity ?? rule.severity,
    values: hit.values,
    inherited,
    hash: hashOf('outcome', { code: rule.code, subject: hit.subject, values: hashable(hit.values) }),
  };
}

/** The same failing in the basis in force: same code, and same subject or same tag. */
function sameAsBefore(hit: Hit, before: readonly Hit[]): boolean {
  const same = before.filter((old) => old.subject === hit.subject);
  const candidates = same.length > 0 ? same : before.filter((old) => old.tag === hit.tag);
  return candidates.some((old) => {
    if (hit.worse === undefined || old.worse === undefined) return true;
    return hit.worse <= old.worse + NOT_WORSE * Math.abs(old.worse);
  });
}

/**
 * Asks every document rule. Outcomes in the order of the rulebook; `inherited` where the basis in force already fails the
 * same rule on the same subject, not worse by more than 0.5 %, and the rule lets itself be inherited.
 */
export function judge(input: JudgeInput): Outcome[] {
  const ctx = contextOf(input);
  const before = input.prior && contextOf({ ...input.prior, imports: input.imports, rules: input.rules });
  return RULEBOOK.flatMap((rule) => {
    const hits = ask(rule, ctx);
    if (hits.length === 0) return [];
    const old = before && rule.inheritable !== false ? ask(rule, before) : [];
    return hits.map((hit) => outcomeOf(rule, hit, ctx, sameAsBefore(hit, old)));
  });
}

/** The justification of the document that clears an outcome: same code, tied to this very outcome by its hash. */
export function clearedBy(outcome: Outcome, doc: Basis): Justification | undefined {
  if (outcome.severity !== 'justify') return undefined;
  return doc.justifications.find((one) => one.code === outcome.code && one.hash === outcome.hash);
}

/** Outcomes that keep a gate shut: stops, and justifies without a justification; inherited ones and notes left out. */
export function blocking(outcomes: readonly Outcome[], doc: Basis): Outcome[] {
  return outcomes.filter((outcome) => {
    if (outcome.inherited || outcome.severity === 'note') return false;
    return outcome.severity === 'stop' || clearedBy(outcome, doc) === undefined;
  });
}
