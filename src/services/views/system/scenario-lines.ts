/* The credible scenarios of a group: load, required area on the scale of what is installed, use and verdict. */
import { type Answer, type Basis, type Group, type Scenario } from '@domain/basis';
import { type Evaluation, outputOf, scenarioOrder, type Verdict } from '@domain/evaluate';
import { groupLabel, scenarioLabel } from '@domain/projections';
import { convert, dimensionOf, formatNumber, type Q, toSI, unitLabel } from '@engine/quantity';
import { percent } from '../shown';
import { baseOf, revisionQuery } from './frame';
import { type OpenedSystem, type Seen } from './open';

export type CredibleLine = {
  number: number;
  name: string;
  href: string;
  disposition: 'credible';
  governs: boolean;
  fluid: string;
  accumulation: string;
  load?: string;
  required?: string;
  area?: number;
  used?: string;
  verdict?: Verdict;
  hidden: boolean;
};

/** A group of relief points that act together, as a page shows it. */
export type GroupView = {
  id: string;
  label: string;
  protects: string;
  lines: CredibleLine[];
  hidden: boolean;
  /** One sentence of fact beside the heading. */
  fact: string;
  units: { load: string; area: string; used: string };
  scale?: { max: number; unit: 'mm²' | 'in²'; installed: number };
  verdict?: Verdict;
};

/** Scenarios in the order of the standard list, each with the number by which pages call it. */
export function numbered(doc: Basis): { scenario: Scenario; number: number }[] {
  return doc.scenarios
    .toSorted((a, b) => scenarioOrder(a.key) - scenarioOrder(b.key))
    .map((scenario, index) => ({ scenario, number: index + 1 }));
}

/** The address of a calculation sheet. */
export function sheetHref(of: OpenedSystem, key: string): string {
  const path = key.split('/').map(encodeURIComponent).join('/');
  return `${baseOf(of)}/sheets/${path}${revisionQuery(of)}`;
}

const inUnit = (q: Q | undefined, unit: string): number | undefined => (q ? convert(q, unit) : undefined);

function figureOf(evaluation: Evaluation, path: string): Q | undefined {
  const found = evaluation.figures[path];
  return typeof found === 'object' ? found : undefined;
}

function commonUnit(units: readonly (string | undefined)[], otherwise: string): string {
  return units.find((unit) => unit !== undefined) ?? otherwise;
}

type Worked = { load: Q | undefined; required: Q | undefined; use: number | undefined; verdict: Verdict };

function workedOf(evaluation: Evaluation, id: string): Worked {
  const verdict = evaluation.figures[`sheets/size:${id}#verdict`];
  return {
    load: outputOf(evaluation.sheets[`load:${id}`], 'relief_load'),
    required: outputOf(evaluation.sheets[`size:${id}`], 'A_required'),
    use: figureOf(evaluation, `sheets/size:${id}#use`)?.value,
    verdict: typeof verdict === 'string' ? (verdict as Verdict) : 'not-sized',
  };
}

/** How far the allowed pressure lies above the MAWP, %; nothing where the limit is one of vacuum. */
function accumulationOf(seen: Seen, id: string): string {
  const limit = seen.evaluation?.sheets[`limit:${id}`];
  const [mawp, allowed] = [outputOf(limit, 'MAWP'), outputOf(limit, 'MAAP')];
  if (!mawp || !allowed || toSI(mawp) === 0 || toSI(allowed) < 0) return '–';
  return formatNumber((toSI(allowed) / toSI(mawp) - 1) * 100, 0);
}

/** A load in the unit of its column; one by volume among masses keeps its own unit. */
function loadText(load: Q, unit: string): string {
  const own = dimensionOf(load.unit) !== dimensionOf(unit);
  if (own) return `${formatNumber(load.value)}\u00a0${unitLabel(load.unit)}`;
  const value = convert(load, unit);
  return formatNumber(value, value >= 100 ? 0 : undefined);
}

function lineOf(
  of: OpenedSystem,
  seen: Seen,
  each: { scenario: Scenario; number: number; answer: Answer },
  units: { load: string; area: string },
  governing: string | undefined,
): CredibleLine {
  const { scenario, answer, number } = each;
  const id = `${scenario.id}/${answer.id}`;
  const head = {
    number,
    name: `${scenarioLabel(seen.body, scenario)}${answer.name === undefined ? '' : `, ${answer.name}`}`,
    href: sheetHref(of, `size:${id}`),
    disposition: 'credible' as const,
    fluid: seen.body.fluids.find((one) => one.id === answer.fluid)?.name ?? '–',
    accumulation: accumulationOf(seen, id),
    hidden: of.hidden,
    governs: governing === `size:${id}`,
  };
  if (!seen.evaluation) return head;
  const { load, required, use, verdict } = workedOf(seen.evaluation, id);
  const area = inUnit(required, units.area);
  return {
    ...head,
    verdict,
    ...(load ? { load: loadText(load, units.load) } : {}),
    ...(area === undefined ? {} : { area, required: formatNumber(area, units.area === 'in2' ? 3 : 0) }),
    ...(use === undefined ? {} : { used: percent(use) }),
  };
}

function protectsOf(doc: Basis, group: Group): string {
  const item = doc.equipment.find((one) => one.id === group.limiting.equipment);
  const side =
    item && item.sides.length > 1 ? item.sides.find((one) => one.id === group.limiting.side) : undefined;
  return `${item?.tag ?? ''}${side ? `, ${side.name}` : ''}`;
}

function factOf(seen: Seen, group: Group, lines: readonly CredibleLine[], hidden: boolean): string {
  if (hidden) return 'hidden until your own figures are in';
  const lead = lines.find((line) => line.governs);
  const verdict = seen.evaluation?.groups[group.id]?.verdict ?? 'not-sized';
  if (!lead?.used) return 'not sized';
  return `governing: ${lead.name}, ${lead.used}\u00a0% used, ${verdict}`;
}

function groupView(of: OpenedSystem, seen: Seen, group: Group): GroupView {
  const { body, evaluation } = seen;
  const answers = numbered(body)
    .filter(({ scenario }) => scenario.disposition === 'credible')
    .flatMap(({ scenario, number }) =>
      scenario.answers
        .filter((answer) => answer.group === group.id)
        .map((answer) => ({ scenario, number, answer })),
    );
  const installed = evaluation && figureOf(evaluation, `groups/${group.id}#installed`);
  const worked = evaluation
    ? answers.map((each) => workedOf(evaluation, `${each.scenario.id}/${each.answer.id}`))
    : [];
  const area = commonUnit([installed?.unit], body.units === 'US' ? 'in2' : 'mm2');
  const load = commonUnit(
    worked.map((one) => one.load?.unit),
    body.units === 'US' ? 'lb/h' : 'kg/h',
  );
  const result = evaluation?.groups[group.id];
  const lines = answers.map((each) => lineOf(of, seen, each, { load, area }, result?.governing));
  const areas = lines.flatMap((line) => line.area ?? []);
  return {
    id: group.id,
    label: groupLabel(body, group),
    protects: protectsOf(body, group),
    lines,
    hidden: of.hidden,
    fact: factOf(seen, group, lines, of.hidden),
    units: { load: unitLabel(load), area: unitLabel(area), used: '%' },
    ...(installed
      ? {
          scale: {
            max: Math.max(installed.value, ...areas) * 1.1,
            unit: area === 'in2' ? ('in²' as const) : ('mm²' as const),
            installed: installed.value,
          },
        }
      : {}),
    ...(result ? { verdict: result.verdict } : {}),
  };
}

/** The groups of a basis with their credible scenarios. */
export function groupViews(of: OpenedSystem, seen: Seen): GroupView[] {
  return seen.body.groups.map((group) => groupView(of, seen, group));
}
