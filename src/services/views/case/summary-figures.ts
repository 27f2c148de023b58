/* The figures of the summary to sign: each device before and after, the largest scenarios, the pressures of the leading device. */
import { quantityOf, type Group, type ReliefPoint } from '@domain/basis';
import { type Evaluation, outputOf, type Verdict } from '@domain/evaluate';
import {
  groupLabel,
  leadingGroup,
  pointFacts,
  type RungKind,
  scenarioLabel,
  scenarioOfKey,
} from '@domain/projections';
import { lettersOf } from '@domain/projections/read';
import { convert, formatNumber, fromSI, toSI, unitLabel } from '@engine/quantity';
import { type CaseDocumentFile } from '../../case-file';
import { type Evaluated } from '../../evaluate-document';
import { changeHref } from './addresses';

/** A figure before and after; `moved` when a reader would see another. */
export type Pair = { before: string; after: string; moved: boolean; worse: boolean };
export type DeviceLine = {
  system: string;
  tag: string;
  href: string;
  verdict: Verdict;
  verdictBefore: Verdict | null;
  use: Pair;
  inlet: Pair;
  back: Pair;
  set: Pair & { unit: string };
  moved: boolean;
};
export type LadderView = {
  of: string;
  unit: string;
  present?: LadderFigures;
  proposed: LadderFigures;
  captions: { present: string; proposed: string };
};
export type LadderFigures = {
  set: number;
  operating?: number;
  reseating?: number;
  relieving?: number;
  backPressure?: number;
  mawp?: number;
  allowed?: number;
};
export type LeadView = {
  system: string;
  group: string;
  installed: string;
  facts: { label: string; figure: string; verdict: Verdict; of: string }[];
  scale: { max: number; unit: 'mm²' | 'in²'; installed: number; present?: number };
  rows: {
    name: string;
    href: string;
    required: number;
    before?: number;
    used: string;
    over: boolean;
    governs: boolean;
  }[];
  ladder?: LadderView;
};

const RUNGS: Partial<Record<RungKind, keyof LadderFigures>> = {
  operating: 'operating',
  'operating-max': 'operating',
  reseating: 'reseating',
  set: 'set',
  mawp: 'mawp',
  maap: 'allowed',
  relieving: 'relieving',
  'back-pressure': 'backPressure',
};

function pair(before: number | undefined, after: number | undefined, decimals = 1): Pair {
  const text = (value: number | undefined) => (value === undefined ? '–' : formatNumber(value, decimals));
  const [one, two] = [text(before), text(after)];
  return {
    before: one,
    after: two,
    moved: one !== two,
    worse: before !== undefined && after !== undefined && after > before,
  };
}

function useOf(truth: Evaluated | undefined, point: string): number | undefined {
  if (!truth) return undefined;
  const groups = truth.body.groups.filter(({ members }) => members.some((member) => member.point === point));
  const group = leadingGroup(
    truth.body,
    truth.evaluation,
    groups.map(({ id }) => id),
  );
  const use = group && truth.evaluation.groups[group.id]?.use;
  return use === undefined ? undefined : use * 100;
}

/** A pressure of a device as a share of its set pressure, %. */
function ofSet(truth: Evaluated | undefined, id: string, which: 'inletLoss' | 'total'): number | undefined {
  const figure = truth?.evaluation.points[id]?.[which];
  if (!figure) return undefined;
  if (figure.unit === '%') return figure.value;
  const set = quantityOf(truth?.body.reliefPoints.find((point) => point.id === id)?.set);
  return set ? (toSI(figure) / toSI(set)) * 100 : undefined;
}

function setOf(truth: Evaluated | undefined, id: string, unit: string): number | undefined {
  const set = quantityOf(truth?.body.reliefPoints.find((point) => point.id === id)?.set);
  return set && convert(set, unit);
}

function changedIn(one: CaseDocumentFile, point: ReliefPoint): boolean {
  const before = one.before?.body.reliefPoints.find((each) => each.id === point.id);
  return JSON.stringify(before) !== JSON.stringify(point);
}

/** One line for each relief point of a system. */
export function deviceLines(one: CaseDocumentFile, base: string): DeviceLine[] {
  const { before, after } = one;
  return (after?.body.reliefPoints ?? []).map((point) => {
    const unit = quantityOf(point.set)?.unit ?? 'bar_g';
    const set = pair(setOf(before, point.id, unit), setOf(after, point.id, unit), 2);
    const use = pair(useOf(before, point.id), useOf(after, point.id));
    const inlet = pair(ofSet(before, point.id, 'inletLoss'), ofSet(after, point.id, 'inletLoss'));
    const back = pair(ofSet(before, point.id, 'total'), ofSet(after, point.id, 'total'));
    return {
      system: one.document.tag,
      tag: point.tag,
      href: changeHref(base, one.document.tag, `reliefPoints/${point.id}`),
      verdict: after?.evaluation.points[point.id]?.verdict ?? 'not-sized',
      verdictBefore: before?.evaluation.points[point.id]?.verdict ?? null,
      use,
      inlet,
      back,
      set: { ...set, unit: unitLabel(unit) },
      moved: changedIn(one, point) || [use, inlet, back, set].some((each) => each.moved),
    };
  });
}

function rungsOf(truth: Evaluated | undefined, id: string, unit: string): LadderFigures | undefined {
  const rungs = truth && pointFacts(truth.body, truth.evaluation, id)?.rungs;
  const figures: Partial<LadderFigures> = {};
  for (const rung of rungs ?? []) {
    const name = RUNGS[rung.kind];
    if (name && figures[name] === undefined) figures[name] = fromSI(rung.pa, unit).value;
  }
  return figures.set === undefined ? undefined : { ...figures, set: figures.set };
}

function ladderOf(one: CaseDocumentFile, group: Group): LadderView | undefined {
  const points = group.members.flatMap((member) =>
    (one.after?.body.reliefPoints ?? []).filter((point) => member.credited && point.id === member.point),
  );
  const point = points.find((each) => changedIn(one, each)) ?? points[0];
  const unit = quantityOf(point?.set)?.unit;
  const proposed = point && unit !== undefined ? rungsOf(one.after, point.id, unit) : undefined;
  if (!point || unit === undefined || !proposed) return undefined;
  const present = rungsOf(one.before, point.id, unit);
  const revision = one.base?.number;
  return {
    of: point.tag,
    unit: unitLabel(unit),
    ...(present ? { present } : {}),
    proposed,
    captions: { present: revision == null ? 'in force' : `rev ${String(revision)}`, proposed: 'this case' },
  };
}

type Areas = { required: number; use: number };

function areaIn(evaluation: Evaluation | undefined, key: string, unit: string): Areas | undefined {
  const required = outputOf(evaluation?.sheets[key], 'A_required');
  const use = evaluation?.figures[`sheets/${key}#use`];
  if (!required || typeof use !== 'object' || use.value <= 0) return undefined;
  return { required: convert(required, unit), use: use.value };
}

function factOf(truth: Evaluated | undefined, group: string, label: string): LeadView['facts'] {
  const result = truth?.evaluation.groups[group];
  if (!truth || !result) return [];
  const found = truth.body.groups.find((each) => each.id === group);
  const letters = found ? lettersOf(truth.body, found) : null;
  const figure = result.use === undefined ? '–' : `${formatNumber(result.use * 100, 1)} %`;
  return [
    {
      label,
      figure,
      verdict: result.verdict,
      of: letters === null ? 'of what is installed' : `of ${letters}`,
    },
  ];
}

/** The group that is used most after the change, with its three largest scenarios; undefined when nothing of it is sized. */
export function leadOf(one: CaseDocumentFile, sheetHref: (key: string) => string): LeadView | undefined {
  const { before, after } = one;
  const group = after && leadingGroup(after.body, after.evaluation);
  if (!after || !group) return undefined;
  const unit = after.body.units === 'US' ? 'in2' : 'mm2';
  const keys = after.body.scenarios.flatMap((scenario) =>
    scenario.answers
      .filter((answer) => answer.group === group.id)
      .map((answer) => `size:${scenario.id}/${answer.id}`),
  );
  const sized = keys.flatMap((key) => {
    const now = areaIn(after.evaluation, key, unit);
    return now ? [{ key, now, was: areaIn(before?.evaluation, key, unit) }] : [];
  });
  const largest = sized.toSorted((a, b) => b.now.use - a.now.use).slice(0, 3);
  const first = largest[0];
  if (!first) return undefined;
  const installed = first.now.required / first.now.use;
  const present = first.was && first.was.required / first.was.use;
  const areas = largest.flatMap((each) => [each.now.required, each.was?.required ?? 0]);
  const ladder = ladderOf(one, group);
  const revision = one.base?.number;
  return {
    system: one.document.tag,
    group: groupLabel(after.body, group),
    installed: lettersOf(after.body, group) ?? 'installed',
    facts: [
      ...factOf(before, group.id, revision == null ? 'In force' : `In force, rev ${String(revision)}`),
      ...factOf(after, group.id, 'With the change'),
    ],
    scale: {
      max: Math.max(1e-9, installed, present ?? 0, ...areas) * 1.1,
      unit: unit === 'in2' ? 'in²' : 'mm²',
      installed,
      ...(present === undefined ? {} : { present }),
    },
    rows: largest.map(({ key, now, was }) => {
      const scenario = scenarioOfKey(after.body, key);
      return {
        name: scenario ? scenarioLabel(after.body, scenario) : key,
        href: sheetHref(key),
        required: now.required,
        ...(was ? { before: was.required } : {}),
        used: formatNumber(now.use * 100, 1),
        over: now.use > 1.001,
        governs: after.evaluation.groups[group.id]?.governing === key,
      };
    }),
    ...(ladder ? { ladder } : {}),
  };
}
