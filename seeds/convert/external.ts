/* External sheets: calculations of the site's relief study that this engine does not work, with their stored figures. */
import { type ExternalSheet, type F, type Input } from '@domain/basis';
import { isVent } from './axes';
import { type DemoAnswerResult, type DemoDevice, type DemoQ } from './demo-types';
import { compact, plainQ } from './figures';
import { idOf } from './ids';
import { pointId } from './points';

/** Who made an external sheet, and in which study: the site's own, or that of a case. */
export const SITE_STUDY = 'Relief study RS-2023';
const TITLES: Record<string, string> = {
  load: 'Relief load',
  size: 'Required area',
  rated: 'Rated capacity',
  inlet: 'Inlet loss',
  outlet: 'Back pressure',
  force: 'Reaction force and noise',
};

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
    title: `${TITLES[sheet.about] ?? sheet.about}, ${sheet.scenario.replaceAll('-', ' ')}, ${sheet.group}`,
    author: sheet.study,
    method: sheet.method,
    inputs: sheet.inputs,
    figures: fromStudy(figuresOf(sheet), sheet.study),
    words: sheet.about === 'size' ? areaKind(sheet.method) : undefined,
  });
}

type About = 'rated' | 'inlet' | 'outlet' | 'force';
type Results = Record<string, unknown>;

function pick(results: Results, names: Record<string, string>): Record<string, F> {
  const entries = Object.entries(names).flatMap(([ours, theirs]) => {
    const value = results[theirs];
    if (isQ(value)) return [[ours, plainQ(value)]];
    return typeof value === 'number'
      ? [[ours, { value: Number((value / 100).toPrecision(6)), unit: '-' }]]
      : [];
  });
  return Object.fromEntries(entries) as Record<string, F>;
}

const FIGURES: Record<About, Record<string, string>> = {
  rated: {
    rated_capacity: 'rated_capacity',
  },
  inlet: {
    inlet_loss: 'inlet_loss',
    velocity: 'inlet_velocity_max',
  },
  outlet: { built_up_back_pressure: 'built_up_back_pressure' },
  force: { reaction_force: 'reaction_force', noise_at_30_m: 'noise_at_30_m' },
};
const METHODS: Record<About, string> = {
  rated: 'a.rated-capacity',
  inlet: 'g.inlet-loss',
  outlet: 'g.outlet-isothermal',
  force: 'g.reaction-force',
};

/** Total back pressure, gauge: the worst common cause as a share of set. */
function totalOf(device: DemoDevice, results: Results): Record<string, F> {
  const share =
    results['total_back_pressure_common_cause_percent_of_set'] ??
    results['total_back_pressure_percent_of_set'];
  if (typeof share !== 'number' || !device.set_pressure) return {};
  const value = Number(((share / 100) * device.set_pressure.value).toPrecision(6));
  return { total_back_pressure: { value, unit: device.set_pressure.unit } };
}

function inputsFor(about: About, point: string): Record<string, Input> {
  const inputs: Record<string, Input> = { point: { list: [point] } };
  if (about !== 'force') inputs['set_pressure'] = { use: `reliefPoints/${point}/set` };
  if (about === 'rated') inputs['area'] = { use: `reliefPoints/${point}/orifice/actual` };
  return inputs;
}

/** The stored results of a device, the back pressure that sized it, and the study they come from. */
export type DeviceResults = { results: Results; backPressure: DemoQ | undefined; study: string };

/** The external sheets about one device: rated capacity (that of vents is worked), inlet loss, back pressure, force. */
export function deviceSheets(device: DemoDevice, found: DeviceResults): ExternalSheet[] {
  const { results, backPressure, study } = found;
  const point = pointId(device.tag);
  return (Object.keys(FIGURES) as About[]).flatMap((about) => {
    if (about === 'rated' && isVent(device)) return [];
    const picked = pick(results, FIGURES[about]);
    const used: Record<string, F> =
      about === 'outlet' && backPressure ? { P2: plainQ(backPressure), ...totalOf(device, results) } : {};
    const figures = { ...used, ...picked };
    if (Object.keys(figures).length === 0) return [];
    const fanno = about === 'outlet' && results['outlet_model'] !== 'g.outlet-isothermal';
    const inputs = inputsFor(about, point);
    return [
      {
        id: idOf('xs', about, device.tag),
        about,
        title: `${TITLES[about] ?? about} of ${device.tag}`,
        author: study,
        method: fanno ? 'g.outlet-fanno' : METHODS[about],
        inputs,
        figures: fromStudy(figures, study),
      },
    ];
  });
}
