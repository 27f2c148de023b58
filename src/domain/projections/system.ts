/* projectSystem: the register rows of one relief basis. */
import { type Basis, namesOf, quantityOf, type ReliefPoint, type Scenario } from '@domain/basis';
import {
  codeOf,
  type Evaluation,
  limitingSide,
  lookupOf,
  outletOf,
  outputOf,
  scenarioOrder,
  worstOf,
} from '@domain/evaluate';
import { formatQuantity, toSI } from '@engine/quantity';
import {
  areaOf,
  figure,
  groupLabel,
  leadingGroup,
  letterOf,
  lettersOf,
  scenarioLabel,
  scenarioOfKey,
} from './read';
import {
  type ConditionRow,
  type PointRow,
  type ProjectionFacts,
  type ScenarioRow,
  si,
  type SystemRow,
  type Truth,
  unit,
} from './rows';

export type SystemProjection = {
  truth: Truth;
  system: SystemRow;
  points: PointRow[];
  scenarios: ScenarioRow[];
  conditions: ConditionRow[];
};

/**
 * The register rows of a relief basis for one truth. Pressures are Pa gauge, areas m², loads kg/s; units beside them are those
 * in which they are shown.
 */
export function projectSystem(
  doc: Basis,
  evaluation: Evaluation,
  truth: Truth,
  facts: ProjectionFacts,
): SystemProjection {
  return {
    truth,
    system: systemRow(doc, evaluation, facts),
    points: doc.reliefPoints.map((point) => pointRow(doc, evaluation, facts, point)),
    scenarios: doc.scenarios.map((scenario) => scenarioRow(doc, evaluation, facts, scenario)),
    conditions: conditionRows(doc, facts),
  };
}

function headOf(doc: Basis, facts: ProjectionFacts, elementId: string, tag: string, name: string) {
  return { siteId: facts.siteId, unitId: doc.unit, elementId, tag, name };
}

function sizedOf(evaluation: Evaluation, group: string | undefined) {
  const result = group === undefined ? undefined : evaluation.groups[group];
  const required = figure(evaluation, `groups/${group ?? ''}#required`);
  return {
    requiredSi: si(required),
    requiredUnit: unit(required),
    use: result?.use ?? null,
    margin: result?.use === undefined ? null : 1 / result.use - 1,
    verdict: result?.verdict ?? ('not-sized' as const),
  };
}

function latestExamined(scenarios: readonly Scenario[]): string | null {
  return (
    scenarios
      .flatMap(({ examined }) => examined?.on ?? [])
      .toSorted()
      .at(-1) ?? null
  );
}

function systemRow(doc: Basis, evaluation: Evaluation, facts: ProjectionFacts): SystemRow {
  const group = leadingGroup(doc, evaluation);
  const result = group && evaluation.groups[group.id];
  const scenario = scenarioOfKey(doc, result?.governing);
  const load = outputOf(
    evaluation.sheets[(result?.governing ?? '').replace(/^size:/, 'load:')],
    'relief_load',
  );
  const installed = group && figure(evaluation, `groups/${group.id}#installed`);
  return {
    ...headOf(doc, facts, '', doc.tag, doc.name),
    ...sizedOf(evaluation, group?.id),
    verdict: worstOf(Object.values(evaluation.groups).map(({ verdict }) => verdict)),
    revision: facts.revision ?? null,
    caseId: facts.caseId ?? null,
    service: doc.service,
    grade: doc.grade,
    ownerId: facts.ownerId ?? null,
    points: doc.reliefPoints.length,
    devices: doc.reliefPoints.map(({ tag }) => tag).join(', '),
    governing: scenario?.id ?? null,
    governingName: scenario ? scenarioLabel(doc, scenario) : null,
    governingGroup: group ? groupLabel(doc, group) : null,
    loadSi: si(load),
    loadUnit: unit(load),
    installedSi: si(installed),
    installedUnit: unit(installed),
    letter: group ? lettersOf(doc, group) : null,
    stops: facts.stops ?? 0,
    justifies: facts.justifies ?? 0,
    examinedOn: latestExamined(doc.scenarios),
    inForceSince: facts.inForceSince ?? null,
  };
}

/** The name of a device by its axes, in the terms of the code of what it protects. */
export function kindOf(doc: Basis, point: ReliefPoint): string {
  const group = doc.groups.find(({ members }) => members.some((member) => member.point === point.id));
  const found = group && limitingSide(lookupOf(doc), group.limiting);
  const names = namesOf(point.axes, point.purpose, found && codeOf(found.side, doc));
  return names[0] ?? 'relief device';
}

function dischargesTo(doc: Basis, point: ReliefPoint): string {
  const end = outletOf({ basis: doc }, point)?.end;
  if (!end) return '';
  return end.to === 'header'
    ? (end.header ?? 'header')
    : (end.location ?? end.equipment ?? end.to.replace('-', ' '));
}

function pointRow(doc: Basis, evaluation: Evaluation, facts: ProjectionFacts, point: ReliefPoint): PointRow {
  const groups = doc.groups
    .filter(({ members }) => members.some((member) => member.point === point.id))
    .map(({ id }) => id);
  const group = leadingGroup(doc, evaluation, groups);
  const scenario = scenarioOfKey(doc, group && evaluation.groups[group.id]?.governing);
  const result = evaluation.points[point.id];
  const set = quantityOf(point.set) ?? quantityOf(point.setVacuum) ?? quantityOf(point.disk?.burst);
  const area = areaOf(point, doc.units);
  const loss = result?.inletLoss;
  return {
    ...headOf(doc, facts, point.id, point.tag, point.name ?? ''),
    ...sizedOf(evaluation, group?.id),
    verdict: result?.verdict ?? 'not-sized',
    systemTag: doc.tag,
    equipment:
      doc.equipment.find(({ id }) => id === (point.on?.equipment ?? group?.limiting.equipment))?.tag ?? '',
    kind: kindOf(doc, point),
    purpose: point.purpose,
    service: point.service,
    setSi: si(set),
    setUnit: unit(set),
    letter: letterOf(point),
    areaSi: si(area),
    areaUnit: unit(area),
    governing: scenario?.id ?? null,
    governingName: scenario ? scenarioLabel(doc, scenario) : null,
    ratedSi: si(result?.rated),
    ratedUnit: unit(result?.rated),
    inletLoss: loss && set ? toSI(loss) / toSI(set) : null,
    backSi: si(result?.total),
    backUnit: unit(result?.total),
    dischargesTo: dischargesTo(doc, point),
  };
}

/** The answer of a scenario that a row shows: the one with the largest use, else the first. */
function shownAnswer(evaluation: Evaluation, scenario: Scenario): Scenario['answers'][number] | undefined {
  const useOf = (id: string) => figure(evaluation, `sheets/size:${scenario.id}/${id}#use`)?.value ?? -1;
  return scenario.answers.toSorted((a, b) => useOf(b.id) - useOf(a.id))[0];
}

function scenarioRow(
  doc: Basis,
  evaluation: Evaluation,
  facts: ProjectionFacts,
  scenario: Scenario,
): ScenarioRow {
  const answer = shownAnswer(evaluation, scenario);
  const id = `${scenario.id}/${answer?.id ?? ''}`;
  const group = doc.groups.find((one) => one.id === answer?.group);
  const load = outputOf(evaluation.sheets[`load:${id}`], 'relief_load');
  const required = outputOf(evaluation.sheets[`size:${id}`], 'A_required');
  const relieving = outputOf(evaluation.sheets[`limit:${id}`], 'relieving_pressure');
  const verdict = evaluation.figures[`sheets/size:${id}#verdict`];
  const governed = Object.values(evaluation.groups).some(
    ({ governing }) => scenarioOfKey(doc, governing)?.id === scenario.id,
  );
  return {
    ...headOf(doc, facts, scenario.id, scenario.id, scenarioLabel(doc, scenario)),
    systemTag: doc.tag,
    key: scenario.key,
    ord: scenarioOrder(scenario.key),
    disposition: scenario.disposition ?? null,
    groupName: group ? groupLabel(doc, group) : null,
    loadSi: si(load),
    loadUnit: unit(load),
    requiredSi: si(required),
    requiredUnit: unit(required),
    relievingSi: si(relieving),
    relievingUnit: unit(relieving),
    use: figure(evaluation, `sheets/size:${id}#use`)?.value ?? null,
    verdict:
      verdict === 'adequate' || verdict === 'marginal' || verdict === 'inadequate' ? verdict : 'not-sized',
    governs: governed,
    examinedOn: scenario.examined?.on ?? null,
  };
}

function conditionRows(doc: Basis, facts: ProjectionFacts): ConditionRow[] {
  return doc.fieldConditions.map((condition) => {
    const q = quantityOf(condition.requires.figure);
    const requires = [condition.requires.words, q && formatQuantity(q)]
      .filter((part) => part !== undefined)
      .join(', ');
    const supports = doc.scenarios.filter(({ dependsOn }) =>
      (dependsOn ?? []).some((item) => item.condition === condition.id),
    );
    return {
      ...headOf(doc, facts, condition.id, condition.tag, requires),
      systemTag: doc.tag,
      kind: condition.kind,
      requires,
      supports: supports.map(({ id }) => id),
      roundMonths: condition.roundMonths ?? null,
    };
  });
}
