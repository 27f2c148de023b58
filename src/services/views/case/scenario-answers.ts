/* The answers of a scenario as their forms show them: fluid, group, accumulation, how load and size are had, and their results. */
import { ACCUMULATIONS, type Answer, type Basis, type Calc, type Group, type Scenario } from '@domain/basis';
import { outputOf } from '@domain/evaluate';
import { METHODS } from '@engine/catalog';
import { type Evaluated } from '../../evaluate-document';
import { wayOf } from '../../edit/form/answers';
import { inline, shownQ } from '../shown';

export type Choice = { value: string; label: string };
export type Choices = { load: Choice[]; size: Choice[]; fluids: Choice[]; groups: Choice[] };
export type AnswerView = {
  path: string;
  name: string;
  fluid: string;
  group: string;
  accumulation: string;
  load: string;
  size: string;
  /** What the sheets come to, in words; nothing where they are hidden. */
  result?: string;
  refused: string[];
};

const LOAD_TOPICS = /^(e|f)\./;
const SIZE_TOPICS = /^(a\.gas|b\.steam|c\.liquid|c\.liquid-noncertified)$/;
export const ACCUMULATION_CHOICES: Choice[] = ACCUMULATIONS.map((value) => ({
  value,
  label: value.replaceAll('-', ' '),
}));

function methods(pattern: RegExp): Choice[] {
  return METHODS.filter((method) => pattern.test(method.id)).map((method) => ({
    value: `method:${method.id}`,
    label: method.title,
  }));
}

function externals(doc: Basis, about: 'load' | 'size'): Choice[] {
  return doc.externalSheets
    .filter((sheet) => sheet.about === about)
    .map((sheet) => ({ value: `external:${sheet.id}`, label: `External: ${sheet.title}` }));
}

/** What an answer can be made of: methods, external sheets, a stated load; fluids and groups of the basis. */
export function calcChoices(doc: Basis, labelOf: (doc: Basis, group: Group) => string): Choices {
  return {
    load: [
      ...methods(LOAD_TOPICS),
      { value: 'given', label: 'Stated, with its origin' },
      ...externals(doc, 'load'),
      { value: 'none', label: 'not had yet' },
    ],
    size: [...methods(SIZE_TOPICS), ...externals(doc, 'size'), { value: 'none', label: 'not sized here' }],
    fluids: doc.fluids.map((fluid) => ({ value: fluid.id, label: fluid.name })),
    groups: doc.groups.map((group) => ({ value: group.id, label: labelOf(doc, group) })),
  };
}

function resultOf(now: Evaluated, key: string): string | undefined {
  const load = outputOf(now.evaluation.sheets[`load:${key}`], 'relief_load');
  const area = outputOf(now.evaluation.sheets[`size:${key}`], 'A_required');
  const parts = [
    load && `load ${inline(shownQ(load, 0))}`,
    area && `required ${inline(shownQ(area))}`,
  ].filter((part) => part !== undefined);
  return parts.length > 0 ? parts.join(', ') : undefined;
}

function refusals(now: Evaluated, key: string): string[] {
  const texts = ['limit', 'load', 'size'].flatMap(
    (kind) => now.evaluation.sheets[`${kind}:${key}`]?.refused?.text ?? [],
  );
  return [...new Set(texts)];
}

function answerView(now: Evaluated, scenario: Scenario, answer: Answer, hidden: boolean): AnswerView {
  const key = `${scenario.id}/${answer.id}`;
  const result = hidden ? undefined : resultOf(now, key);
  const way = (calc: Calc) => wayOf(calc);
  return {
    path: `scenarios/${scenario.id}/answers/${answer.id}`,
    name: answer.name ?? '',
    fluid: answer.fluid ?? '',
    group: answer.group ?? '',
    accumulation: answer.accumulation,
    load: way(answer.load),
    size: way(answer.size),
    ...(result === undefined ? {} : { result }),
    refused: hidden ? [] : refusals(now, key),
  };
}

/** The answers of a scenario; `doc` is masked where results are hidden. */
export function answerViews(
  both: { now: Evaluated; doc: Basis },
  scenario: Scenario,
  hidden: boolean,
): AnswerView[] {
  return scenario.answers.map((answer) => answerView(both.now, scenario, answer, hidden));
}
