/* Verdicts: the use of each size sheet, the governing sheet of each group and what the group comes to. */
import { type Group, type Path } from '@domain/basis';
import { SCENARIOS } from '@domain/scenarios';
import { fromSI, type Q, toSI } from '@engine/quantity';
import { areaKindOf, type Installed, installedFor } from './installed';
import { outputOf } from './sheets';
import { type GroupResult, type SheetKey, type Verdict } from './types';
import { type CredibleAnswer, type Work } from './work';

/** Use above which a sheet is inadequate: one, with 0.1 % for the rounding of units. */
export const INADEQUATE_ABOVE = 1.001;

export type Sized = {
  ca: CredibleAnswer;
  key: SheetKey;
  verdict: Verdict;
  use?: number;
  required?: Q;
  installed?: Installed;
};

/** Share of the installed area from which a group is marginal; the site may choose 0.80 to 0.98. */
export function marginalFrom(work: Work): number {
  const value = work.rules.parameters['marginalFrom'];
  return typeof value === 'number' ? value : 0.9;
}

/** The verdict that a use gives: inadequate above 1.001, marginal from `from`. */
export function verdictOf(use: number, from: number): Verdict {
  if (!Number.isFinite(use)) return 'not-sized';
  if (use > INADEQUATE_ABOVE) return 'inadequate';
  return use >= from ? 'marginal' : 'adequate';
}

/** Use and verdict of one answer's size sheet: required against installed area of the same kind. */
export function sizedAnswer(work: Work, ca: CredibleAnswer): Sized {
  const key: SheetKey = `size:${ca.id}`;
  const sheet = work.sheets[key];
  const required = outputOf(sheet, 'A_required');
  if (!sheet || !required) return { ca, key, verdict: 'not-sized' };
  const installed = installedFor(work, ca, areaKindOf(sheet));
  if (installed.m2 <= 0 || installed.lacking.length > 0)
    return { ca, key, verdict: 'not-sized', required, installed };
  const use = toSI(required) / installed.m2;
  return { ca, key, verdict: verdictOf(use, marginalFrom(work)), use, required, installed };
}

const ORDER = new Map(SCENARIOS.map((scenario, index) => [scenario.key, index]));

/** Place of a scenario in the standard list; one that a site added comes after it. */
export function scenarioOrder(key: string): number {
  return ORDER.get(key) ?? ORDER.size;
}

const WORST: Verdict[] = ['inadequate', 'not-sized', 'marginal', 'adequate'];

/** The worst of several verdicts; nothing to judge is not sized. */
export function worstOf(verdicts: readonly Verdict[]): Verdict {
  return WORST.find((verdict) => verdicts.includes(verdict)) ?? 'not-sized';
}

/** The result of a group: governing is the largest use, ties going to the earlier scenario of the standard list. */
export function groupResult(group: Group, sized: readonly Sized[]): GroupResult {
  const own = sized.filter((one) => one.ca.group?.id === group.id);
  const verdict = worstOf(own.map((one) => one.verdict));
  const ranked = own
    .filter((one) => one.use !== undefined)
    .toSorted((a, b) => byUse(a, b) || scenarioOrder(a.ca.scenario.key) - scenarioOrder(b.ca.scenario.key));
  const governing = ranked[0];
  if (!governing || governing.use === undefined) return { verdict };
  return { governing: governing.key, use: governing.use, verdict };
}

function byUse(a: Sized, b: Sized): number {
  const [ua, ub] = [a.use ?? 0, b.use ?? 0];
  return Math.abs(ua - ub) <= 1e-9 * Math.max(ua, ub) ? 0 : ub - ua;
}

/** The flat figures of one sized answer. */
export function sizedFigures(sized: Sized, unit: string): Record<Path, Q | string> {
  const at = `sheets/${sized.key}`;
  const figures: Record<Path, Q | string> = { [`${at}#verdict`]: sized.verdict };
  if (sized.installed) {
    figures[`${at}#installed_area`] = fromSI(sized.installed.m2, unit);
    figures[`${at}#area_kind`] = sized.installed.kind;
  }
  if (sized.use !== undefined) {
    figures[`${at}#use`] = { value: sized.use, unit: '-' };
    figures[`${at}#margin`] = { value: 1 / sized.use - 1, unit: '-' };
  }
  return figures;
}
