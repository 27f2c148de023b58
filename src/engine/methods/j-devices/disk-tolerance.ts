/* Method j.disk-tolerance: burst tolerance, manufacturing range and margin to the operating pressure of a rupture disk. */
import { type Method } from '../../catalog/types';
import { type SheetBuilder, type Show, workSheet } from '../../sheet';
import { optional, output } from '../common/describe';
import { SYSTEM_UNITS, type System, systemOf } from '../common/system';
import { burstTolerance } from '../h-limits';
import { type BurstRange, burstSpan, highestSpecified } from './burst';

const CLAUSE = 'ASME VIII-1 UG-127(a)(1); API 520-1, manufacturing range and burst tolerance';

/** Manufacturing range, and the tolerance of a marked pressure with its equation: a stated share, else that of ASME. */
type Terms = BurstRange & { tolerance: (marked: number) => number; tex: (v: Show, marked: string) => string };

function readTerms(sheet: SheetBuilder, system: System): Terms {
  const rangeUp = sheet.number('range_up', '-', { min: 0, max: 0.5, fallback: 0 }, 'r_+');
  const rangeDown = sheet.number('range_down', '-', { min: 0, max: 0.5, fallback: 0 }, 'r_-');
  if (sheet.has('tolerance')) {
    const share = sheet.number('tolerance', '-', { min: 0, max: 0.5 }, 't');
    const tex = (v: Show, marked: string) => `${v('tolerance')} \\cdot ${v(marked)}`;
    return { rangeUp, rangeDown, tolerance: (marked) => share * marked, tex };
  }
  const least = system === 'US' ? 2 : 15;
  return {
    rangeUp,
    rangeDown,
    tolerance: (marked) => burstTolerance(marked, system),
    tex: (v, marked) => `\\max(${least},\\ 0.05 \\cdot ${v(marked)})`,
  };
}

/** The burst pressure that is specified: as given, or the highest that the MAWP allows. */
function specifiedStep(sheet: SheetBuilder, { rangeUp }: BurstRange, system: System): number {
  const { Pg } = SYSTEM_UNITS[system];
  const limit = sheet.has('MAWP') ? sheet.number('MAWP', Pg, { above: 0 }, 'p_{MAWP}') : undefined;
  const highest = limit === undefined ? undefined : highestSpecified(limit, rangeUp);
  if (highest !== undefined) {
    sheet.step(
      {
        key: 'ps',
        tex: 'p_{s,max}',
        meaning: 'highest burst pressure that may be specified',
        value: highest,
        unit: Pg,
        clause: 'no disk of the lot marked above the MAWP',
      },
      (v) => `\\frac{${v('MAWP')}}{1 + ${v('range_up')}}`,
    );
    sheet.output('specified_burst_max', highest, Pg);
  }
  if (sheet.has('specified_burst')) {
    const specified = sheet.number('specified_burst', Pg, { above: 0 }, 'p_s');
    if (highest !== undefined && specified > highest * (1 + 1e-6))
      sheet.warn(
        'SPECIFIED_ABOVE_MAWP',
        'With its manufacturing range a disk of this lot may be marked above the MAWP.',
      );
    return sheet.keep('p', specified, 'p_s');
  }
  if (highest === undefined)
    return sheet.refuse(
      'INPUT_MISSING',
      'specified_burst',
      'The specified burst pressure (specified_burst), or the MAWP that bounds it, is missing.',
    );
  return sheet.keep('p', highest, 'p_{s,max}');
}

function spanSteps(
  sheet: SheetBuilder,
  specified: number,
  terms: Terms,
  system: System,
): { markedMin: number } {
  const { Pg } = SYSTEM_UNITS[system];
  const span = burstSpan(specified, terms, terms.tolerance);
  if (span.burstMin <= 0)
    sheet.refuse(
      'VALUE_IMPOSSIBLE',
      'specified_burst',
      'Range and tolerance take the lowest burst pressure to nought or below: such a disk cannot be specified.',
    );
  const rows: [keyof typeof span, string, string, (v: (key: string) => string) => string][] = [
    [
      'markedMax',
      'p_{m,max}',
      'highest marked burst pressure',
      (v) => `${v('p')} \\cdot (1 + ${v('range_up')})`,
    ],
    [
      'markedMin',
      'p_{m,min}',
      'lowest marked burst pressure',
      (v) => `${v('p')} \\cdot (1 - ${v('range_down')})`,
    ],
    [
      'burstMax',
      'p_{b,max}',
      'highest pressure of bursting',
      (v) => `${v('markedMax')} + ${terms.tex(v, 'markedMax')}`,
    ],
    [
      'burstMin',
      'p_{b,min}',
      'lowest pressure of bursting',
      (v) => `${v('markedMin')} - ${terms.tex(v, 'markedMin')}`,
    ],
  ];
  const names = {
    markedMax: 'marked_burst_max',
    markedMin: 'marked_burst_min',
    burstMax: 'burst_max',
    burstMin: 'burst_min',
  };
  for (const [key, tex, meaning, template] of rows) {
    sheet.step({ key, tex, meaning, value: span[key], unit: Pg, clause: CLAUSE, memory: true }, template);
    sheet.output(names[key], span[key], Pg);
  }
  return { markedMin: span.markedMin };
}

/** Operating pressure against the lowest marked burst pressure, by the operating ratio of the disk. */
function operatingSteps(sheet: SheetBuilder, markedMin: number, system: System): void {
  const { Pg } = SYSTEM_UNITS[system];
  const ratio = sheet.number('operating_ratio', '-', { above: 0, max: 1, fallback: 0.7 }, 'r_o');
  if (!sheet.has('operating_ratio'))
    sheet.warn(
      'RATIO_ASSUMED',
      'The operating ratio of the disk is not given: 0.7 is taken, that of plain metal disks (Ludwig, vol. 1, 3rd ed., p. 457).',
    );
  const allowed = sheet.step(
    {
      key: 'po',
      tex: 'p_{o,max}',
      meaning: 'highest operating pressure',
      value: ratio * markedMin,
      unit: Pg,
    },
    (v) => `${v('operating_ratio')} \\cdot ${v('markedMin')}`,
  );
  sheet.output('operating_max', allowed, Pg);
  if (!sheet.has('operating_pressure')) return;
  const operating = sheet.number('operating_pressure', Pg, { min: 0 }, 'p_o');
  const least = sheet.step(
    {
      key: 'pn',
      tex: 'p_{m,needed}',
      meaning: 'lowest marked burst pressure that the operating pressure needs',
      value: operating / ratio,
      unit: Pg,
    },
    (v) => `\\frac{${v('operating_pressure')}}{${v('operating_ratio')}}`,
  );
  sheet.output('burst_needed', least, Pg);
  sheet.output('operating_margin', allowed - operating, SYSTEM_UNITS[system].dP);
  sheet.output('operating_allowed', operating <= allowed * (1 + 1e-9));
  if (operating > allowed * (1 + 1e-9))
    sheet.warn(
      'OPERATING_TOO_HIGH',
      'The operating pressure is above what the operating ratio allows under the lowest marked burst pressure: the disk will fatigue and burst early.',
    );
}

/** j.disk-tolerance: span of burst pressures and margin to operation. */
export const DISK_TOLERANCE: Method = {
  id: 'j.disk-tolerance',
  version: 1,
  topic: 'j.disk-tolerance',
  title: 'Rupture disk: burst tolerance, manufacturing range, operating margin',
  editions: ['ASME XIII:2021; ASME VIII-1, UG-127', 'EN ISO 4126-2:2018'],
  source:
    'ASME VIII-1 UG-127(a)(1): tolerance 5 % above 40 psig (300 kPa), 2 psi (15 kPa) up to it (from memory); manufacturing range and operating ratio as Ludwig, Applied Process Design, vol. 1, 3rd ed., p. 457, works them',
  validity:
    'Burst pressures at the coincident temperature of the disk. EN ISO 4126-2 agrees tolerance and range by order: enter them. The marked pressure of the lot received replaces the range.',
  inputs: [
    optional(
      'specified_burst',
      'specified burst pressure (the highest that the MAWP allows when not given)',
      'pressure-gauge',
      { rangeKey: 'burstPressure' },
    ),
    optional('MAWP', 'maximum allowable working pressure', 'pressure-gauge', { rangeKey: 'mawp' }),
    optional('range_up', 'manufacturing range above the specified pressure', 'dimensionless'),
    optional('range_down', 'manufacturing range below it', 'dimensionless'),
    optional('tolerance', 'burst tolerance (ASME’s 5 %, or 2 psi, 15 kPa, when not given)', 'dimensionless'),
    optional('operating_pressure', 'highest operating pressure', 'pressure-gauge', {
      rangeKey: 'operatingPressure',
    }),
    optional('operating_ratio', 'operating ratio of the disk (0.7 when not given)', 'dimensionless'),
  ],
  outputs: [
    output('specified_burst_max', 'highest burst pressure that may be specified', 'pressure-gauge'),
    output('marked_burst_max', 'highest marked burst pressure', 'pressure-gauge'),
    output('marked_burst_min', 'lowest marked burst pressure', 'pressure-gauge'),
    output('burst_max', 'highest pressure of bursting', 'pressure-gauge'),
    output('burst_min', 'lowest pressure of bursting', 'pressure-gauge'),
    output('operating_max', 'highest operating pressure', 'pressure-gauge'),
    output('burst_needed', 'lowest marked burst pressure that operation needs', 'pressure-gauge'),
    output('operating_margin', 'operating margin', 'pressure-difference'),
    output('operating_allowed', 'whether the operating pressure is allowed'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const system = systemOf(inputs, ['specified_burst', 'MAWP', 'operating_pressure']);
      const terms = readTerms(sheet, system);
      const specified = specifiedStep(sheet, terms, system);
      const { markedMin } = spanSteps(sheet, specified, terms, system);
      operatingSteps(sheet, markedMin, system);
    });
  },
};
