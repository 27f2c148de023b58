/* Method h.set-tolerance: tolerance of the set pressure, reseating, and cold differential test pressure. */
import { type Method } from '../../catalog/types';
import { type SheetBuilder, workSheet } from '../../sheet';
import { input, optional, output } from '../common/describe';
import { SYSTEM_UNITS, type System, systemOf } from '../common/system';
import {
  CODE_BASES,
  type CodeBasis,
  coldDifferentialTestPressure,
  reseatPressure,
  setTolerance,
  VALVE_TYPES,
  type ValveType,
} from './limits';

/** The lowest and highest opening that the tolerance allows. */
function bandSteps(sheet: SheetBuilder, set: number, tolerance: number, unit: string): void {
  sheet.step(
    {
      key: 'min',
      tex: 'p_{min}',
      meaning: 'lowest opening within the tolerance',
      value: set - tolerance,
      unit,
    },
    (v) => `${v('set_pressure')} - ${v('tol')}`,
  );
  sheet.step(
    {
      key: 'max',
      tex: 'p_{max}',
      meaning: 'highest opening within the tolerance',
      value: set + tolerance,
      unit,
    },
    (v) => `${v('set_pressure')} + ${v('tol')}`,
  );
  sheet.output('set_min', set - tolerance, unit);
  sheet.output('set_max', set + tolerance, unit);
}

/** The tolerance and the band it makes. */
function toleranceSteps(sheet: SheetBuilder, set: number, system: System, basis: CodeBasis): void {
  const u = SYSTEM_UNITS[system];
  const tolerance = setTolerance(set, { basis, units: system });
  const clause = basis === 'en' ? 'ISO 4126-1:2013/Amd 1:2016' : 'ASME VIII-1 2015 UG-134(d)';
  const fixed = system === 'US' ? '2' : '15';
  const upTo = system === 'US' ? '70' : '500';
  const rule = (p: string) =>
    basis === 'en'
      ? `\\max(0.03 \\cdot ${p},\\ 10\\,\\text{kPa})`
      : set <= Number(upTo)
        ? `${fixed} \\quad (${p} \\le ${upTo})`
        : `0.03 \\cdot ${p}`;
  sheet.step(
    {
      key: 'tol',
      tex: '\\Delta p_{tol}',
      meaning: 'tolerance of the set pressure, plus and minus',
      value: tolerance,
      unit: u.dP,
      clause,
    },
    (v) => rule(v('set_pressure')),
  );
  sheet.output('set_tolerance', tolerance, u.dP);
  bandSteps(sheet, set, tolerance, u.Pg);
}

function reseatSteps(sheet: SheetBuilder, set: number, system: System): void {
  if (!sheet.has('blowdown')) return;
  const u = SYSTEM_UNITS[system];
  const blowdown = sheet.number('blowdown', '-', { min: 0, max: 0.5 }, 'b');
  const drop = sheet.step(
    { key: 'drop', tex: '\\Delta p_b', meaning: 'blowdown as a pressure', value: set * blowdown, unit: u.dP },
    (v) => `${v('blowdown')} \\cdot ${v('set_pressure')}`,
  );
  const reseat = sheet.step(
    {
      key: 'reseat',
      tex: 'p_{reseat}',
      meaning: 'reseating pressure',
      value: reseatPressure(set, blowdown),
      unit: u.Pg,
    },
    (v) => `${v('set_pressure')} - ${v('drop')}`,
  );
  sheet.output('reseat_pressure', reseat, u.Pg);
  sheet.output('blowdown_pressure', drop, u.dP);
}

/** The pressure on the test bench; only where the maker's multiplier or a back pressure makes it differ or it is asked. */
function coldSteps(sheet: SheetBuilder, set: number, system: System): void {
  if (!sheet.has('temperature_multiplier') && !sheet.has('constant_superimposed') && !sheet.has('valve_type'))
    return;
  const u = SYSTEM_UNITS[system];
  const type = sheet.word<ValveType>('valve_type', VALVE_TYPES);
  const constantSuperimposed = sheet.number(
    'constant_superimposed',
    u.Pg,
    { min: 0, fallback: 0 },
    'p_{sup}',
  );
  const multiplier = sheet.number('temperature_multiplier', '-', { above: 0, fallback: 1 }, 'f_T');
  const value = coldDifferentialTestPressure(set, { constantSuperimposed, multiplier, type });
  if (value <= 0)
    sheet.refuse(
      'VALUE_IMPOSSIBLE',
      'constant_superimposed',
      'The constant superimposed back pressure is not below the set pressure: the spring would carry nothing.',
    );
  sheet.step(
    {
      key: 'CDTP',
      tex: 'p_{CDTP}',
      meaning: `cold differential test pressure, ${type} valve`,
      value,
      unit: u.Pg,
      clause: 'API 520-1, definition of CDTP',
      memory: true,
    },
    (v) =>
      type === 'conventional'
        ? `(${v('set_pressure')} - ${v('constant_superimposed')}) \\cdot ${v('temperature_multiplier')}`
        : `${v('set_pressure')} \\cdot ${v('temperature_multiplier')}`,
  );
  sheet.output('CDTP', value, u.Pg);
}

/** h.set-tolerance: set tolerance, reseating pressure and cold differential test pressure. */
export const SET_TOLERANCE: Method = {
  id: 'h.set-tolerance',
  version: 1,
  topic: 'h.set-tolerance',
  title: 'Set-pressure tolerance, reseating and cold differential test pressure',
  editions: ['ASME VIII-1 (ASME XIII since 2021)', 'EN ISO 4126-1'],
  source:
    'ASME VIII-1 2015 UG-134(d); ISO 4126-1:2013/Amd 1:2016; CDTP as defined in API 520-1 (from memory)',
  validity:
    'Pressure relief valves; the temperature multiplier comes from the maker; balanced and pilot-operated valves subtract no back pressure.',
  inputs: [
    input('set_pressure', 'set pressure', 'pressure-gauge', { rangeKey: 'setPressure' }),
    optional('blowdown', 'blowdown as a fraction of set', 'dimensionless', { rangeKey: 'blowdown' }),
    optional('constant_superimposed', 'constant superimposed back pressure', 'pressure-gauge', {
      rangeKey: 'superimposed',
    }),
    optional('temperature_multiplier', 'maker’s temperature multiplier (1 when not given)', 'dimensionless', {
      rangeKey: 'cdtpRatio',
    }),
    optional('valve_type', 'conventional, balanced or pilot', undefined, { words: [...VALVE_TYPES] }),
    optional('code_basis', 'code of the device (ASME VIII-1 when not given)', undefined, {
      words: [...CODE_BASES],
    }),
  ],
  outputs: [
    output('set_tolerance', 'tolerance, plus and minus', 'pressure-difference'),
    output('set_min', 'lowest opening', 'pressure-gauge'),
    output('set_max', 'highest opening', 'pressure-gauge'),
    output('reseat_pressure', 'reseating pressure', 'pressure-gauge'),
    output('blowdown_pressure', 'blowdown as a pressure', 'pressure-difference'),
    output('CDTP', 'cold differential test pressure', 'pressure-gauge'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const system = systemOf(inputs, ['set_pressure']);
      const set = sheet.number('set_pressure', SYSTEM_UNITS[system].Pg, { above: 0 }, 'p_{set}');
      const basis = sheet.word<CodeBasis>('code_basis', CODE_BASES, 'asme-viii-1');
      toleranceSteps(sheet, set, system, basis);
      reseatSteps(sheet, set, system);
      coldSteps(sheet, set, system);
    });
  },
};
