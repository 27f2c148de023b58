/* Method e.fire-supercritical: contents above their critical point, heated by a fire and vented along the isobar. */
import { type Method } from '../../catalog/types';
import { fromSI } from '../../quantity';
import { type SheetBuilder, workSheet } from '../../sheet';
import { input, optional, output } from '../common/describe';
import { mustRun, numbered, readColumns } from '../common/numbered';
import { drainageAdequate, FIRE_CREDIT_INPUTS, fireFactor } from './credits';
import { FIRE_FORMS, fireHeat } from './heat';
import { governingStep, type IsobarPoint, type VentStep, ventSteps } from './supercritical-flow';

const CLAUSE = 'energy balance of a vessel vented at constant pressure';
const COLUMNS = [
  { name: 'T', unit: 'K', tex: 'T', bounds: { above: 0 } },
  { name: 'v', unit: 'm3/kg', tex: 'v', bounds: { above: 0 } },
  { name: 'h', unit: 'kJ/kg', tex: 'h' },
];

/** The isobar of the relieving pressure, in K, m³/kg and J/kg. */
function readIsobar(sheet: SheetBuilder): IsobarPoint[] {
  const [T = [], v = [], h = []] = readColumns(sheet, COLUMNS, 2);
  mustRun(sheet, 'v', v, 'rise');
  mustRun(sheet, 'h', h, 'rise');
  return T.map((temperature, i) => ({ T: temperature, v: v[i] ?? 0, h: (h[i] ?? 0) * 1000 }));
}

/** Heat from the fire in W: as given, or by the pool-fire equation on the surface that the fire reaches. */
function heatStep(sheet: SheetBuilder): number {
  if (sheet.has('heat_input')) return sheet.number('heat_input', 'W', { above: 0 }, 'Q');
  const area = sheet.number('A_exposed', 'm2', { above: 0 }, 'A');
  const F = fireFactor(sheet);
  const drained = drainageAdequate(sheet);
  const constant = drained ? FIRE_FORMS.SI.drained : FIRE_FORMS.SI.undrained;
  return sheet.step(
    {
      key: 'heat_input',
      tex: 'Q',
      meaning: 'heat absorbed from the fire, by the equation for wetted surfaces',
      value: fireHeat(area, F, drained, 'SI'),
      unit: 'W',
      clause: 'API 521, heat absorption of wetted surfaces',
      memory: true,
    },
    (v) => `${constant} \\cdot ${v('F')} \\cdot ${v('A_exposed')}^{0.82}`,
  );
}

/** One line for each step along the isobar, kg/h. */
function stepLines(sheet: SheetBuilder, steps: readonly VentStep[]): void {
  steps.forEach((step, i) => {
    const n = i + 1;
    const a = (name: string) => numbered(name, n);
    const b = (name: string) => numbered(name, n + 1);
    sheet.step(
      {
        key: `W_${n}`,
        tex: `W_{${n}}`,
        meaning: `vented between point ${n} and point ${n + 1}, at ${step.T.toFixed(1)} K`,
        value: step.W * 3600,
        unit: 'kg/h',
        clause: CLAUSE,
      },
      (v) =>
        `3.6 \\cdot ${v('heat_input')} \\cdot \\frac{2 (${v(b('v'))} - ${v(a('v'))})}{(${v(b('v'))} + ${v(a('v'))})(${v(b('h'))} - ${v(a('h'))})}`,
    );
  });
}

/** The step that governs and its state, as outputs. */
function governing(sheet: SheetBuilder, steps: readonly VentStep[]): void {
  const index = governingStep(steps);
  const step = steps[index];
  if (!step) return;
  const needs = steps.map((s) => s.W * 3600 * Math.sqrt(s.v));
  sheet.say({
    symbol: 'n_{gov}',
    meaning: 'step that asks for the most area: the greatest W√v, not the greatest W',
    value: String(index + 1),
    tex: `\\max_n W_n\\sqrt{\\bar v_n}:\\ n = ${index + 1},\\ ${(needs[index] ?? 0).toPrecision(4)}`,
    clause: 'nozzle at given pressure: area in proportion to W√v',
  });
  if (steps.length > 1 && (index === 0 || index === steps.length - 1))
    sheet.warn(
      'GOVERNING_AT_EDGE',
      `The governing step is the ${index === 0 ? 'first' : 'last'} of the isobar entered: extend the points beyond it until the need falls again.`,
    );
  const unit = sheet.quantity('h').unit === 'Btu/lb' ? 'lb/h' : 'kg/h';
  sheet.output('relief_load', fromSI(step.W, unit).value, unit);
  sheet.output('greatest_load', fromSI(Math.max(...steps.map((s) => s.W)), unit).value, unit);
  sheet.output('governing_step', index + 1);
  sheet.output('T_relief', step.T, 'K');
  sheet.output('v_relief', step.v, 'm3/kg');
}

/** How long each stage lasts, when the volume is known. */
function duration(sheet: SheetBuilder, points: readonly IsobarPoint[], Q: number): void {
  if (!sheet.has('volume')) return;
  const V = sheet.number('volume', 'm3', { above: 0 }, 'V');
  const first = points[0];
  if (first) sheet.output('contents', V / first.v, 'kg');
  const time = points.slice(1).reduce((sum, b, i) => {
    const a = points[i];
    return a ? sum + ((V / ((a.v + b.v) / 2)) * (b.h - a.h)) / Q : sum;
  }, 0);
  sheet.step(
    { key: 't', meaning: 'time to vent along the points entered', value: time, unit: 's', clause: CLAUSE },
    (v) => `\\sum_n \\frac{${v('V')}\\,(h_{n+1} - h_n)}{\\bar v_n \\cdot ${v('heat_input')}}`,
  );
  sheet.output('duration', time / 60, 'min');
}

/** e.fire-supercritical: load of a vessel whose contents are above their critical point at relief. */
export const FIRE_SUPERCRITICAL: Method = {
  id: 'e.fire-supercritical',
  version: 1,
  topic: 'e.fire-supercritical',
  title: 'Fire on contents above their critical point: load step by step',
  editions: ['API 521, 5th to 7th edition (approach)'],
  source:
    'Energy balance of a full vessel vented along the isobar of the relieving pressure; the stepwise way published by R. Ouderkirk, “Rigorously Size Relief Valves for Supercritical Fluids”, Chemical Engineering Progress, August 2002 (from memory)',
  validity:
    'Contents above the critical pressure at relief, no latent heat; vessel well mixed and full of one phase; isobar from a property source, fine enough that v and h run nearly straight between points.',
  inputs: [
    optional('heat_input', 'heat from the fire (or give A_exposed)', 'power', { rangeKey: 'heatInput' }),
    optional('A_exposed', 'surface that the fire reaches, for the pool-fire equation', 'area', {
      rangeKey: 'wettedArea',
    }),
    ...FIRE_CREDIT_INPUTS,
    input(
      'T',
      'temperature on the isobar of the relieving pressure (T_2, T_3 … further points)',
      'temperature',
      {
        each: 'point',
      },
    ),
    input('v', 'specific volume there (v_2, v_3 …)', 'specific-volume', { each: 'point' }),
    input('h', 'specific enthalpy there (h_2, h_3 …)', 'specific-energy', { each: 'point' }),
    optional('volume', 'volume of the vessel, for contents and time', 'volume', { rangeKey: 'volume' }),
  ],
  outputs: [
    output('relief_load', 'load of the governing step', 'mass-flow'),
    output('greatest_load', 'greatest load along the isobar', 'mass-flow'),
    output('governing_step', 'number of the governing step', 'dimensionless'),
    output('T_relief', 'temperature of the governing step', 'temperature'),
    output('v_relief', 'specific volume of the governing step', 'specific-volume'),
    output('contents', 'mass in the vessel at the first point', 'mass'),
    output('duration', 'time along the points entered', 'time'),
    output('F', 'environment factor', 'dimensionless'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const points = readIsobar(sheet);
      const Q = heatStep(sheet);
      const steps = ventSteps(Q, points);
      stepLines(sheet, steps);
      governing(sheet, steps);
      duration(sheet, points, Q);
    });
  },
};
