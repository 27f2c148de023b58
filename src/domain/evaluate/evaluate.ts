/* evaluate: from a basis, the judgement half of the site rules and its imports to everything that follows. Pure, never throws. */
import { type Basis, type Path } from '@domain/basis';
import { type JudgementRules } from '@domain/rules';
import { displayUnit, type Q, QuantityError } from '@engine/quantity';
import { groupResult, type Sized, sizedAnswer, sizedFigures } from './groups';
import { CATALOG, evaluationKey } from './keys';
import { limitSheet } from './limits';
import { loadSheet } from './loads';
import { pointResults } from './points';
import { refusedSheet } from './sheets';
import { sizeSheet } from './sizes';
import { type Evaluation, type ImportSet, type Sheet, type SheetKey } from './types';
import { credibleAnswers, type CredibleAnswer, lookupOf, type Work } from './work';

/** Version of the engine as it is recorded (never hashed). */
export const ENGINE = 'engine-1';

function workOf(basis: Basis, rules: JudgementRules, imports: ImportSet): Work {
  const lookup = lookupOf(basis);
  const answers = credibleAnswers(basis, lookup);
  return {
    basis,
    rules,
    imports,
    context: { barometer: rules.barometer },
    lookup,
    answers,
    sheets: {},
    busy: new Set(),
  };
}

/** Makes a sheet; figures whose units do not fit refuse it with the unit's own sentence instead of ending the evaluation. */
function guarded(work: Work, key: SheetKey, at: Path, make: () => Sheet): void {
  try {
    work.sheets[key] = make();
  } catch (error) {
    if (!(error instanceof QuantityError) && !(error instanceof RangeError)) throw error;
    work.sheets[key] = refusedSheet(
      key,
      'unit',
      { inputs: {}, from: {} },
      'UNIT',
      `A unit does not fit: ${error.message}`,
      at,
    );
  }
}

function workAnswer(work: Work, ca: CredibleAnswer): void {
  const at = `scenarios/${ca.scenario.id}/answers/${ca.answer.id}`;
  guarded(work, `limit:${ca.id}`, at, () => limitSheet(work, ca));
  guarded(work, `load:${ca.id}`, `${at}/load`, () => loadSheet(work, ca));
}

/** A sized answer is not sized when a unit of its areas does not fit. */
function sizedOrNot(work: Work, ca: CredibleAnswer): Sized {
  try {
    return sizedAnswer(work, ca);
  } catch (error) {
    if (error instanceof QuantityError) return { ca, key: `size:${ca.id}`, verdict: 'not-sized' };
    throw error;
  }
}

function pointsOrNone(work: Work, groups: Evaluation['groups']): Evaluation['points'] {
  try {
    return pointResults(work, groups);
  } catch (error) {
    if (!(error instanceof QuantityError)) throw error;
    return Object.fromEntries(
      work.basis.reliefPoints.map((point) => [point.id, { verdict: 'not-sized' as const }]),
    );
  }
}

/**
 * Evaluates a relief basis: limits, loads, sizes, governing scenario of each group, relief points, flat figures by path.
 * Deterministic: the same basis, rules and imports give the same evaluation to the last digit.
 */
export function evaluate(basis: Basis, judgement: JudgementRules, imports: ImportSet): Evaluation {
  const work = workOf(basis, judgement, imports);
  for (const ca of work.answers) workAnswer(work, ca);
  for (const ca of work.answers) {
    guarded(work, `size:${ca.id}`, `scenarios/${ca.scenario.id}/answers/${ca.answer.id}/size`, () =>
      sizeSheet(work, ca),
    );
  }
  const sized = work.answers.map((ca) => sizedOrNot(work, ca));
  const groups = Object.fromEntries(basis.groups.map((group) => [group.id, groupResult(group, sized)]));
  const points = pointsOrNone(work, groups);
  return {
    key: evaluationKey(basis, judgement, imports),
    engine: ENGINE,
    methods: CATALOG.filter((method) => Object.values(work.sheets).some((sheet) => sheet.method === method)),
    sheets: work.sheets,
    groups,
    points,
    figures: figuresOf(work, sized, groups, points),
  };
}

type Figures = Record<Path, Q | string>;

function figuresOf(
  work: Work,
  sized: readonly Sized[],
  groups: Evaluation['groups'],
  points: Evaluation['points'],
): Figures {
  const figures: Figures = {};
  for (const sheet of Object.values(work.sheets)) {
    if (sheet.refused) continue;
    for (const [name, value] of Object.entries(sheet.outputs)) {
      figures[`sheets/${sheet.key}#${name}`] = typeof value === 'boolean' ? String(value) : value;
    }
  }
  const areaUnit = displayUnit('area', work.basis.units);
  for (const one of sized) Object.assign(figures, sizedFigures(one, areaUnit));
  for (const [id, group] of Object.entries(groups)) Object.assign(figures, groupFigures(id, group, figures));
  for (const [id, point] of Object.entries(points)) {
    for (const [name, value] of Object.entries(point)) figures[`points/${id}#${name}`] = value;
  }
  return figures;
}

function groupFigures(id: string, group: Evaluation['groups'][string], figures: Figures): Figures {
  const at = `groups/${id}`;
  const own: Figures = { [`${at}#verdict`]: group.verdict };
  if (group.governing === undefined || group.use === undefined) return own;
  own[`${at}#governing`] = group.governing;
  own[`${at}#use`] = { value: group.use, unit: '-' };
  own[`${at}#margin`] = { value: 1 / group.use - 1, unit: '-' };
  for (const [name, from] of [
    ['required', 'A_required'],
    ['installed', 'installed_area'],
    ['area_kind', 'area_kind'],
  ]) {
    const value = figures[`sheets/${group.governing}#${from ?? ''}`];
    if (value !== undefined && name !== undefined) own[`${at}#${name}`] = value;
  }
  return own;
}
