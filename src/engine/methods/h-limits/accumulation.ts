/* Method h.accumulation: what the pressure may rise to, the relieving pressure, and how high devices may be set. */
import { type Method } from '../../catalog/types';
import { type SheetBuilder, workSheet } from '../../sheet';
import { input, optional, output } from '../common/describe';
import { barometer } from '../common/pressures';
import { SYSTEM_UNITS, type System, systemOf } from '../common/system';
import {
  CODE_BASES,
  type CodeBasis,
  LIMIT_CLASSES,
  type LimitClass,
  type LimitOptions,
  limitTerms,
  maap,
  maxSetPressure,
  relievingPressure,
} from './limits';

const CLAUSES: Partial<Record<CodeBasis, string>> = {
  en: 'PED 2014/68/EU Annex I 7.3',
  'asme-i': 'ASME I PG-67',
};

function clauseOf(basis: CodeBasis): string {
  return CLAUSES[basis] ?? 'ASME VIII-1 UG-125(c)';
}

/** TeX of max(factor · p, p + floor), without the floor where the code has none. */
function limitTex(p: string, limitClass: LimitClass, options: LimitOptions): string {
  const { factor, floor } = limitTerms(limitClass, options);
  return floor === 0 ? `${factor} \\cdot ${p}` : `\\max(${factor} \\cdot ${p},\\ ${p} + ${floor})`;
}

/** What the limit leaves above the set pressure, where one is given. */
function overpressureStep(sheet: SheetBuilder, limit: number, limitClass: LimitClass, system: System): void {
  const u = SYSTEM_UNITS[system];
  if (!sheet.has('set_pressure')) return;
  const set = sheet.number('set_pressure', u.Pg, { above: 0 }, 'p_{set}');
  const allowed = sheet.step(
    {
      key: `over_${limitClass}`,
      tex: `\\Delta p_{${limitClass}}`,
      meaning: `allowable overpressure, ${limitClass}`,
      value: limit - set,
      unit: u.dP,
    },
    (v) => `${v(`maap_${limitClass}`)} - ${v('set_pressure')}`,
  );
  sheet.output(`allowable_overpressure_${limitClass}`, allowed, u.dP);
}

/** Limit, relieving pressure and allowable overpressure of one class. */
function classSteps(
  sheet: SheetBuilder,
  mawp: number,
  limitClass: LimitClass,
  system: System,
  options: LimitOptions,
): void {
  const u = SYSTEM_UNITS[system];
  const clause = clauseOf(options.basis);
  const limit = sheet.step(
    {
      key: `maap_${limitClass}`,
      tex: `p_{MAAP,${limitClass}}`,
      meaning: `maximum accumulated pressure, ${limitClass}`,
      value: maap(mawp, limitClass, options),
      unit: u.Pg,
      clause,
      memory: true,
    },
    (v) => limitTex(v('MAWP'), limitClass, options),
  );
  sheet.output(`max_accumulated_pressure_${limitClass}`, limit, u.Pg);
  const absolute = sheet.step(
    {
      key: `P1_${limitClass}`,
      tex: `P_{1,${limitClass}}`,
      meaning: `that limit, absolute`,
      value: limit + barometer(sheet, system),
      unit: u.P,
    },
    (v) => `${v(`maap_${limitClass}`)} + ${v('atmospheric_pressure')}`,
  );
  sheet.output(`relieving_pressure_${limitClass}`, absolute, u.P);
  overpressureStep(sheet, limit, limitClass, system);
}

/** The relieving pressure of the class asked for: the lower of the limit on the MAWP and on the highest set pressure. */
function relievingSteps(sheet: SheetBuilder, mawp: number, system: System, options: LimitOptions): void {
  if (!sheet.has('limit_class')) return;
  const u = SYSTEM_UNITS[system];
  const limitClass = sheet.word<LimitClass>('limit_class', LIMIT_CLASSES);
  const set = sheet.number('set_pressure', u.Pg, { above: 0 }, 'p_{set}');
  const gauge = sheet.step(
    {
      key: 'p1',
      tex: 'p_1',
      meaning: 'relieving pressure, the lower of the limits on MAWP and on the highest set',
      value: relievingPressure(mawp, set, limitClass, options),
      unit: u.Pg,
      clause: clauseOf(options.basis),
    },
    (v) => `\\min(${v(`maap_${limitClass}`)},\\ ${limitTex(v('set_pressure'), limitClass, options)})`,
  );
  const absolute = sheet.step(
    {
      key: 'P1',
      tex: 'P_1',
      meaning: 'relieving pressure, absolute',
      value: gauge + barometer(sheet, system),
      unit: u.P,
    },
    (v) => `${v('p1')} + ${v('atmospheric_pressure')}`,
  );
  sheet.output('max_accumulated_pressure', maap(mawp, limitClass, options), u.Pg);
  sheet.output('relieving_pressure_gauge', gauge, u.Pg);
  sheet.output('relieving_pressure', absolute, u.P);
}

function setSteps(sheet: SheetBuilder, mawp: number, system: System, basis: CodeBasis): void {
  const u = SYSTEM_UNITS[system];
  const places = [
    ['max_set_first_device', 'first', 'first device'],
    ['max_set_additional_device', 'additional', 'additional device'],
    ['max_set_supplemental_fire_device', 'supplemental-fire', 'supplemental fire device'],
  ] as const;
  for (const [name, place, words] of places) {
    const value = maxSetPressure(mawp, place, basis);
    const share = Math.round((value / mawp) * 1000) / 1000;
    sheet.step(
      {
        key: name,
        tex: `p_{set,max}`,
        meaning: `highest set pressure of the ${words}`,
        value,
        unit: u.Pg,
        clause: 'ASME VIII-1 UG-134',
        memory: true,
      },
      (v) => `${share} \\cdot ${v('MAWP')}`,
    );
    sheet.output(name, value, u.Pg);
  }
}

/** h.accumulation: limits of accumulation and of set pressures. */
export const ACCUMULATION: Method = {
  id: 'h.accumulation',
  version: 1,
  topic: 'h.accumulation',
  title: 'Maximum accumulated pressure, relieving pressure, limits of set pressure',
  editions: ['ASME VIII-1 (ASME XIII since 2021)', 'EN (PED 2014/68/EU)'],
  source:
    'ASME VIII-1 UG-125(c), UG-134; PED 2014/68/EU Annex I 7.3; API 520-1 tables of set and accumulation (from memory)',
  validity:
    'Vessels. Floors in the unit system of the site’s code (3 psi or 20 kPa; 4 psi or 30 kPa); tanks take the full-flow pressure of their vents instead.',
  inputs: [
    input('MAWP', 'MAWP or PS of the limiting equipment', 'pressure-gauge', { rangeKey: 'mawp' }),
    optional('set_pressure', 'highest set pressure of the group', 'pressure-gauge', {
      rangeKey: 'setPressure',
    }),
    optional('atmospheric_pressure', 'barometric pressure', 'pressure-absolute', { rangeKey: 'barometer' }),
    optional('code_basis', 'code of the limiting equipment (ASME VIII-1 when not given)', undefined, {
      words: [...CODE_BASES],
    }),
    optional(
      'en_fire_limit',
      'site’s fire limit under EN as a factor on PS (1.10 when not given)',
      'dimensionless',
    ),
    optional('limit_class', 'class of the scenario, to get the one relieving pressure', undefined, {
      words: [...LIMIT_CLASSES],
    }),
  ],
  outputs: [
    ...LIMIT_CLASSES.flatMap((c) => [
      output(`max_accumulated_pressure_${c}`, `maximum accumulated pressure, ${c}`, 'pressure-gauge'),
      output(`relieving_pressure_${c}`, `that limit, absolute, ${c}`, 'pressure-absolute'),
      output(`allowable_overpressure_${c}`, `allowable overpressure, ${c}`, 'pressure-difference'),
    ]),
    output('max_accumulated_pressure', 'maximum accumulated pressure of the class', 'pressure-gauge'),
    output('relieving_pressure_gauge', 'relieving pressure of the class, gauge', 'pressure-gauge'),
    output('relieving_pressure', 'relieving pressure of the class, absolute', 'pressure-absolute'),
    output('max_set_first_device', 'highest set of the first device', 'pressure-gauge'),
    output('max_set_additional_device', 'highest set of additional devices', 'pressure-gauge'),
    output('max_set_supplemental_fire_device', 'highest set of a supplemental fire device', 'pressure-gauge'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const system = systemOf(inputs, ['MAWP']);
      const basis = sheet.word<CodeBasis>('code_basis', CODE_BASES, 'asme-viii-1');
      const enFireLimit = sheet.number('en_fire_limit', '-', { min: 1.1, max: 1.21, fallback: 1.1 });
      const mawp = sheet.number('MAWP', SYSTEM_UNITS[system].Pg, { above: 0 }, 'p_{MAWP}');
      const options: LimitOptions = { basis, units: system, enFireLimit };
      for (const limitClass of LIMIT_CLASSES) classSteps(sheet, mawp, limitClass, system, options);
      relievingSteps(sheet, mawp, system, options);
      setSteps(sheet, mawp, system, basis);
    });
  },
};
