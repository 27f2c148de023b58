/* External sheets: calculations of the site's relief study that this engine does not work, with their stored figures. */
import { type ExternalSheet, type F, type Input } from '@domain/basis';
import { type DemoAnswerResult, type DemoQ } from './demo-types';
import { compact, plainQ } from './figures';
import { idOf } from './ids';

/** Who made an external sheet, and in which study: the site's own, or that of a case. */
export const SITE_STUDY = 'Relief study RS-2023';
const TITLES = { load: 'Relief load', size: 'Required area' };

/** What an external sheet about an answer is made of. */
export type AnswerSheet = {
  about: 'load' | 'size';
  scenario: string;
  group: string;
  method: string;
  inputs: Record<string, Input>;
  result: DemoAnswerResult | undefined;
  study: string;
};

/** A value of the stored results that is a quantity. */
export function isQ(value: unknown): value is DemoQ {
  return (
    typeof value === 'object' &&
    value !== null &&
    'value' in value &&
    'unit' in value &&
    typeof value.value === 'number'
  );
}

/** Figures of a sheet take the study as their origin. */
function fromStudy(figures: Record<string, F>, study: string): Record<string, F> {
  const origin = { kind: 'calculation' as const, ref: study };
  return Object.fromEntries(Object.entries(figures).map(([name, figure]) => [name, { ...figure, origin }]));
}

function detailFigures(detail: Record<string, unknown> | undefined): Record<string, F> {
  const known = Object.entries(detail ?? {}).filter(([name, value]) => name !== 'C' && isQ(value));
  return Object.fromEntries(known.map(([name, value]) => [name, plainQ(value as DemoQ)]));
}

function figuresOf(sheet: AnswerSheet): Record<string, F> {
  const result = sheet.result;
  if (!result) return {};
  if (sheet.about === 'size') return { A_required: plainQ(result.required_area) };
  return { relief_load: plainQ(result.relief_load), ...detailFigures(result.detail) };
}

/** Actual flow areas are compared with actual ones, effective with effective. */
function areaKind(method: string): Record<string, string> {
  return { area_kind: /^(i\.|t\.|e\.)/.test(method) ? 'actual' : 'effective' };
}

/** An external sheet about the load or the size of an answer. */
export function externalSheet(sheet: AnswerSheet): ExternalSheet {
  return compact({
    id: idOf('xs', sheet.about, sheet.scenario, sheet.group),
    about: sheet.about,
    title: `${TITLES[sheet.about]}, ${sheet.scenario.replaceAll('-', ' ')}, ${sheet.group}`,
    author: sheet.study,
    method: sheet.method,
    inputs: sheet.inputs,
    figures: fromStudy(figuresOf(sheet), sheet.study),
    words: sheet.about === 'size' ? areaKind(sheet.method) : undefined,
  });
}
