/* What the checker must read, choose and work for each group before anything of the originator's is shown. */
import { type Answer, type Basis, getAt, type Group, quantityOf, type Scenario } from '@domain/basis';
import { changedPoints } from '@domain/field';
import { type Q } from '@engine/quantity';
import { changedSheets } from './agreements';
import { type DocumentFacts } from './gate-facts';
import { type CaseClass, type Id, type UnseenEntry } from './types';
import {
  deviceReadings,
  type Draft,
  figure,
  parentReadings,
  ratingReadings,
  type UnseenItem,
  word,
} from './unseen-readings';
import { loadQuantity } from './unseen-tolerances';

export { type UnseenItem } from './unseen-readings';

const answersOf = (doc: Basis, group: Id): { scenario: Scenario; answer: Answer }[] =>
  doc.scenarios
    .filter((scenario) => scenario.disposition === 'credible')
    .flatMap((scenario) => scenario.answers.map((answer) => ({ scenario, answer })))
    .filter(({ answer }) => answer.group === group);

/** Groups whose sheets moved against the base; all of them for a revalidation or a first issue. */
export function groupsToCheck(of: DocumentFacts, kind: CaseClass): Group[] {
  const { doc } = of;
  if (!doc) return [];
  const whole = kind === 'revalidation' || !of.baseEvaluation;
  const moved = new Set(changedSheets(of).map((sheet) => sheet.key));
  return doc.groups.filter((group) =>
    answersOf(doc, group.id).some(
      ({ scenario, answer }) =>
        whole || ['limit', 'load', 'size'].some((sheet) => moved.has(`${sheet}:${scenario.id}/${answer.id}`)),
    ),
  );
}

/** The scenario of a group's governing sheet in the originator's evaluation. */
export function governingScenario(of: DocumentFacts, group: Id): string | undefined {
  return of.evaluation?.groups[group]?.governing?.replace(/^size:/, '').split('/')[0];
}

/** The scenario that the checker chose as governing, if any. */
export function chosenScenario(
  of: DocumentFacts,
  group: Id,
  entries: readonly UnseenEntry[],
): string | undefined {
  const own = entries.filter(
    (each) => each.document === of.document && each.scope === `groups/${group}#governing`,
  );
  return own.sort((a, b) => a.round - b.round).at(-1)?.word;
}

function choices(doc: Basis, group: Group, name: string): Draft[] {
  const credible = doc.scenarios.map((scenario) => scenario.id);
  const phases = ['gas', 'vapour', 'liquid', 'flashing-liquid', 'two-phase', 'supercritical'];
  return [
    word(
      'choice',
      `groups/${group.id}#governing`,
      'governing-scenario',
      `Which scenario governs ${name}`,
      credible,
    ),
    word('choice', `groups/${group.id}#phase`, 'phase', `Phase at relief in what governs ${name}`, phases),
  ];
}

/** The figures of one answer's sheets; `title` is the scenario as the checker has chosen it. */
function sheetFigures(
  of: DocumentFacts,
  scenario: Scenario,
  answer: Answer | undefined,
  title: string,
): Draft[] {
  const key = `${scenario.id}/${answer?.id ?? '-'}`;
  const load = of.evaluation?.sheets[`load:${key}`]?.outputs ?? {};
  const flow =
    ['relief_load', 'relief_flow', 'volumetric_load'].find((name) => name in load) ?? 'relief_load';
  const kind = flow === 'relief_load' ? 'mass-flow' : 'volume-flow';
  return [
    figure(
      'figure',
      `sheets/limit:${key}#MAAP`,
      'limit-pressure',
      `Limit pressure, ${title}`,
      'pressure-gauge',
    ),
    figure('figure', `sheets/limit:${key}#P1`, 'p1', `Relieving pressure P1, ${title}`, 'pressure-absolute'),
    figure('figure', `sheets/load:${key}#${flow}`, loadQuantity(scenario.key), `Relief load, ${title}`, kind),
    figure('figure', `sheets/size:${key}#A_required`, 'required-area', `Required area, ${title}`, 'area'),
  ];
}

function deviceFigures(of: DocumentFacts, group: Group): Draft[] {
  if (!of.doc) return [];
  const changed = changedPoints(of.doc, of.baseDoc).filter((point) =>
    group.members.some((member) => member.point === point.id),
  );
  return changed.flatMap((point) => {
    const result = of.evaluation?.points[point.id];
    return [
      ...(result?.inletLoss
        ? [
            figure(
              'figure',
              `points/${point.id}#inletLoss`,
              'inlet-loss',
              `Inlet loss of ${point.tag}`,
              result.inletLoss.unit === '%' ? 'dimensionless' : 'pressure-difference',
            ),
          ]
        : []),
      ...(result?.total
        ? [
            figure(
              'figure',
              `points/${point.id}#total`,
              'back-pressure',
              `Total back pressure of ${point.tag}`,
              'pressure-gauge',
            ),
          ]
        : []),
    ];
  });
}

/**
 * The mandatory items of a group, in order: readings and choices that give nothing away; once a scenario is chosen, the
 * readings behind it and its figures; the originator's governing sheet when all of these stand and it is another one.
 */
export function itemsOfGroup(
  of: DocumentFacts,
  group: Group,
  number: number,
  entries: readonly UnseenEntry[],
  nameOfScenario: (scenario: Scenario) => string,
): UnseenItem[] {
  const { doc } = of;
  if (!doc) return [];
  const name = `group ${group.name ?? `G${String(number)}`}`;
  const first = [...ratingReadings(doc, group), ...deviceReadings(doc, group), ...choices(doc, group, name)];
  const tail = (scenarioId: string | undefined): Draft[] => {
    const scenario = doc.scenarios.find((each) => each.id === scenarioId);
    if (!scenario) return [];
    const answer = scenario.answers.find((each) => each.group === group.id);
    const parents = answer ? parentReadings(doc, scenario, answer) : [];
    return [
      ...parents,
      ...sheetFigures(of, scenario, answer, nameOfScenario(scenario)),
      ...deviceFigures(of, group),
    ];
  };
  const chosen = chosenScenario(of, group.id, entries);
  const second = tail(chosen);
  const governs = governingScenario(of, group.id);
  const done =
    second.length > 0 &&
    second.every((item) =>
      entries.some((each) => each.document === of.document && each.scope === item.scope),
    );
  const third = done && governs !== chosen ? tail(governs) : [];
  const all = [...first, ...second, ...third].map((item) => ({
    ...item,
    document: of.document,
    group: group.id,
  }));
  return all.filter((item, index) => all.findIndex((each) => each.scope === item.scope) === index);
}

/** The originator's value of an item as it stands; absent when there is none. */
export function originatorsValue(
  of: DocumentFacts,
  item: Pick<UnseenItem, 'scope' | 'group'>,
): Q | string | undefined {
  const [path = '', name = ''] = item.scope.split('#');
  const [list, id = ''] = [path.split('/')[0], path.slice(path.indexOf('/') + 1)];
  if (list === 'sheets') return plain(of.evaluation?.sheets[id]?.outputs[name]);
  if (list === 'points') return plain(of.evaluation?.points[id]?.[name as 'inletLoss' | 'total']);
  if (name === 'governing') return governingScenario(of, item.group);
  if (name === 'phase') {
    const scenario = of.doc?.scenarios.find((each) => each.id === governingScenario(of, item.group));
    const fluid = scenario?.answers.find((each) => each.group === item.group)?.fluid;
    return of.doc?.fluids.find((each) => each.id === fluid)?.phase;
  }
  return plain(of.doc && getAt(of.doc, path));
}

function plain(value: unknown): Q | string | undefined {
  if (typeof value === 'string') return value;
  if (typeof value !== 'object' || value === null || !('value' in value)) return undefined;
  return quantityOf(value as Parameters<typeof quantityOf>[0]);
}
