/* Load, required area, use and verdict of a scenario's row, and the scale that all bars of a table share. */
import { type Basis, type Scenario } from '@domain/basis';
import { type Evaluation, outputOf, type Verdict } from '@domain/evaluate';
import { figure } from '@domain/projections/read';
import { convert, formatNumber, type Q } from '@engine/quantity';
import { type Evaluated } from '../../evaluate-document';
import { percent } from '../shown';

export type Scale = { max: number; installed: number; present?: number; unit: 'mm²' | 'in²' };
type Units = Basis['units'];

/** Unit of loads in a table, as its head says it. */
export function loadUnit(units: Units): string {
  return units === 'US' ? 'lb/h' : 'kg/h';
}

/** Unit of areas in a table, as its head says it. */
export function areaUnit(units: Units): 'mm²' | 'in²' {
  return units === 'US' ? 'in²' : 'mm²';
}

function areaIn(q: Q | undefined, units: Units): number | undefined {
  return q && convert(q, units === 'US' ? 'in2' : 'mm2');
}

function areaText(area: number, units: Units): string {
  return formatNumber(area, units === 'US' ? 3 : 0);
}

type Figures = {
  load?: string;
  required?: string;
  area?: number;
  areaBefore?: number;
  used?: string;
  verdict: Verdict;
};

/** The answer with the largest use; it stands for the scenario in a table. */
function shownAnswer(evaluation: Evaluation, scenario: Scenario): string | undefined {
  const use = (id: string) => figure(evaluation, `sheets/size:${scenario.id}/${id}#use`)?.value ?? -1;
  return scenario.answers.toSorted((a, b) => use(b.id) - use(a.id))[0]?.id;
}

function requiredOf(evaluation: Evaluation | undefined, key: string, units: Units): number | undefined {
  const sheet = evaluation?.sheets[`size:${key}`];
  return sheet?.refused ? undefined : areaIn(outputOf(sheet, 'A_required'), units);
}

function verdictOf(evaluation: Evaluation, key: string): Verdict {
  const found = evaluation.figures[`sheets/size:${key}#verdict`];
  return found === 'adequate' || found === 'marginal' || found === 'inadequate' ? found : 'not-sized';
}

/** What a row of the scenario table says of a credible scenario. */
export function rowFigures(
  now: Evaluation,
  before: Evaluation | undefined,
  scenario: Scenario,
  units: Units,
): Figures {
  const answer = shownAnswer(now, scenario);
  if (answer === undefined) return { verdict: 'not-sized' };
  const key = `${scenario.id}/${answer}`;
  const load = outputOf(now.sheets[`load:${key}`], 'relief_load');
  const area = requiredOf(now, key, units);
  const old = requiredOf(before, key, units);
  const use = figure(now, `sheets/size:${key}#use`)?.value;
  const moved = old !== undefined && area !== undefined && Math.abs(old - area) > 0.005 * area;
  return {
    verdict: verdictOf(now, key),
    ...(load ? { load: formatNumber(convert(load, loadUnit(units)), 0) } : {}),
    ...(area === undefined ? {} : { area, required: areaText(area, units) }),
    ...(moved ? { areaBefore: old } : {}),
    ...(use === undefined ? {} : { used: percent(use) }),
  };
}

function groupFigures(of: Evaluated | undefined, name: string, units: Units): number[] {
  if (!of) return [];
  return of.body.groups.flatMap(
    (group) => areaIn(figure(of.evaluation, `groups/${group.id}#${name}`), units) ?? [],
  );
}

/** One scale for all bars: the installed area of the leading group, and the one before where it is another. */
export function scaleOf(now: Evaluated, before: Evaluated | undefined, units: Units): Scale | null {
  const installed = groupFigures(now, 'installed', units)[0];
  if (installed === undefined) return null;
  const present = groupFigures(before, 'installed', units)[0];
  const required = groupFigures(now, 'required', units);
  const other = present !== undefined && Math.abs(present - installed) > 0.002 * installed;
  return {
    max: Math.max(installed, present ?? 0, ...required) * 1.1,
    installed,
    unit: areaUnit(units),
    ...(other ? { present } : {}),
  };
}
