/* Outcomes of the rulebook as open points: stop, justify, and what the basis in force had failed before. */
import { type Outcome } from '@domain/rulebook/types';
import { type OpenPoint } from '@domain/result';
import {
  type DocumentFacts,
  type Gate,
  type GateFacts,
  GATES,
  placeIn,
  placeOfPath,
  point,
} from '../gate-facts';
import { lengthOf } from '../rich-text';
import { type DueItem } from '../types';
import { daysBetween } from '@domain/dates';

/** True when a rule that is first asked at `first` speaks at `gate`: at its own gate and at every later one. */
export function speaksAt(first: string, gate: Gate): boolean {
  const order: readonly string[] = GATES;
  return order.includes(first) && order.indexOf(first) <= order.indexOf(gate);
}

/** A justification counts while it is tied to this very outcome: same rule, same place, same values. */
export function isJustified(outcome: Outcome, of: DocumentFacts, least: number): boolean {
  return (of.doc?.justifications ?? []).some(
    (each) =>
      each.code === outcome.code &&
      each.subject === outcome.subject &&
      each.hash === outcome.hash &&
      lengthOf(each.text) >= least,
  );
}

/** What an outcome says to a reader whose view is hidden: which rule and where, no figure. */
function sentenceOf(outcome: Outcome, facts: GateFacts): string {
  return facts.hidden ? `${outcome.tag}: the rule “${outcome.code}” is not met.` : outcome.sentence;
}

/** Outcomes that keep a gate shut: every stop, and every justify without its justification; inherited ones wait for approval. */
export function outcomePoints(gate: Gate, of: DocumentFacts, facts: GateFacts): OpenPoint[] {
  return of.outcomes
    .filter((outcome) => outcome.severity !== 'note' && !outcome.inherited)
    .filter((outcome) => speaksAt(facts.ruleGates[outcome.code] ?? 'scenarios', gate))
    .filter((outcome) => outcome.severity === 'stop' || !isJustified(outcome, of, facts.rules.reasonLength))
    .map((outcome) => {
      const ask = outcome.severity === 'justify' ? ' Change it, or justify it in writing.' : '';
      return point(
        outcome.code,
        `${sentenceOf(outcome, facts)}${ask}`,
        placeOfPath(facts, of, outcome.subject),
      );
    });
}

/** Outcomes of rules that read the clock, people or the case. */
export function caseOutcomePoints(gate: Gate, facts: GateFacts): OpenPoint[] {
  return (facts.caseOutcomes ?? [])
    .filter((outcome) => outcome.severity !== 'note' && speaksAt(outcome.gate, gate))
    .map((outcome) =>
      point(outcome.code, sentenceOf(outcome, facts), placeIn(facts, 'outcomes', undefined, outcome.code)),
    );
}

/** The deficiency that owns an inherited outcome: by the hash it was written for, else by its place and rule. */
export function deficiencyOf(outcome: Outcome, of: DocumentFacts, facts: GateFacts): DueItem | undefined {
  return facts.dueItems.find(
    (item) =>
      item.kind === 'deficiency' &&
      item.document === of.document &&
      (item.outcome === outcome.hash || (item.subject === outcome.subject && item.closes === outcome.code)),
  );
}

/**
 * Inherited failures without a deficiency: owner, interim measure and a due day within the site's limit.
 * @param signed also asks for an approver's signature; the signature of the approval itself gives it, so it is asked only after
 */
export function deficiencyPoints(of: DocumentFacts, facts: GateFacts, signed: boolean): OpenPoint[] {
  return of.outcomes
    .filter(
      (outcome) =>
        outcome.inherited &&
        outcome.severity !== 'note' &&
        !isJustified(outcome, of, facts.rules.reasonLength),
    )
    .flatMap((outcome) => {
      const where = placeIn(facts, 'outcomes', of, `${outcome.code}-${outcome.subject}`);
      const said = `${outcome.tag}: ${outcome.code} already failed before this change`;
      const item = deficiencyOf(outcome, of, facts);
      if (!item) return [point('deficiency-unowned', `${said} and no one owns it.`, where)];
      const max = facts.rules.shortfallMax;
      if (lengthOf(item.interim) === 0)
        return [point('deficiency-unowned', `${said}; its deficiency names no interim measure.`, where)];
      if (item.state === 'open' && daysBetween(facts.today, item.due) > max)
        return [
          point(
            'deficiency-unowned',
            `${said}; its deficiency must be due within ${String(max)} days.`,
            where,
          ),
        ];
      if (item.state === 'open' && item.due < facts.today)
        return [
          point(
            'deficiency-unowned',
            `${said}; its deficiency was due on ${item.due}: sign it again with a new day.`,
            where,
          ),
        ];
      return signed && !item.signature
        ? [point('deficiency-unowned', `${said}; no approver has signed its deficiency.`, where)]
        : [];
    });
}
