/* What a centrifugal pump delivers against a pressure rise: by the coefficients of a parabola or by points of its curve. */
import { type MethodInput } from '../../catalog/types';
import { type SheetBuilder } from '../../sheet';
import { optional } from '../common/describe';
import { mustRun, readColumns } from '../common/numbered';
import { meetCurve } from './curve';

/** A pump curve ΔP = ΔP₀ − c Q² in kPa and m³/h: the flow at a pressure rise, 0 at or above shut-off. */
export function pumpFlow(shutoff: number, coefficient: number, rise: number): number {
  return rise >= shutoff ? 0 : Math.sqrt((shutoff - rise) / coefficient);
}

/** Inputs of a pump curve. */
export const PUMP_CURVE_INPUTS: readonly MethodInput[] = [
  optional('shutoff_dp', 'pressure rise at shut-off', 'pressure-difference', { rangeKey: 'pumpShutoff' }),
  optional('curve_coefficient', 'coefficient c of the curve', 'pump-curve'),
  optional(
    'curve_flow',
    'flow of a point of the curve, in place of both (curve_flow_2, … further points)',
    'volume-flow',
    {
      each: 'point',
    },
  ),
  optional('curve_dp', 'pressure rise at that point (curve_dp_2, …)', 'pressure-difference', {
    each: 'point',
  }),
];

const COLUMNS = [
  { name: 'curve_flow', unit: 'm3/h', tex: 'Q', bounds: { min: 0 } },
  { name: 'curve_dp', unit: 'kPa', tex: '\\Delta p', bounds: { min: 0 } },
];

/** A pump curve as read: the greatest rise it reaches, and the step that gives the flow at a needed rise (key `rise`). */
export type PumpCurve = { greatest: number; flowStep: (rise: number) => number };

function byCoefficients(sheet: SheetBuilder): PumpCurve {
  const shutoff = sheet.number('shutoff_dp', 'kPa', { above: 0 }, '\\Delta p_0');
  const c = sheet.number('curve_coefficient', 'kPa/(m3/h)^2', { above: 0 }, 'c');
  const flowStep = (rise: number) =>
    sheet.step(
      {
        key: 'Q',
        meaning: 'flow at the relieving pressure',
        value: pumpFlow(shutoff, c, rise),
        unit: 'm3/h',
      },
      (v) => `\\sqrt{\\frac{\\max(0,\\ ${v('shutoff_dp')} - ${v('rise')})}{${v('curve_coefficient')}}}`,
    );
  return { greatest: shutoff, flowStep };
}

function byPoints(sheet: SheetBuilder): PumpCurve {
  const [flows = [], rises = []] = readColumns(sheet, COLUMNS, 2);
  mustRun(sheet, 'curve_flow', flows, 'rise');
  const greatest = sheet.keep('shutoff_dp', Math.max(...rises), '\\Delta p_{max}');
  const flowStep = (rise: number) => {
    const met = meetCurve(flows, rises, rise);
    if (met.at === 'beyond')
      sheet.refuse(
        'CURVE_ENDS',
        'curve_flow',
        `At the relieving pressure the pump delivers more than the last point of its curve: enter points down to a rise of ${Math.max(0, rise).toPrecision(4)} kPa.`,
      );
    return sheet.step(
      {
        key: 'Q',
        meaning: 'flow at the relieving pressure, by straight lines between the points of the curve',
        value: met.at === 'flow' ? met.flow : 0,
        unit: 'm3/h',
      },
      (v) => `Q(\\Delta p = ${v('rise')})`,
    );
  };
  return { greatest, flowStep };
}

/** Reads the pump curve, by points when they are given, else by its coefficients. */
export function readPumpCurve(sheet: SheetBuilder): PumpCurve {
  return sheet.has('curve_flow') ? byPoints(sheet) : byCoefficients(sheet);
}
