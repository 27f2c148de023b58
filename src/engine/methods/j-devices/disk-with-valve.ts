/* Method j.disk-with-valve: a rupture disk in front of a relief valve, its combination factor and the conditions of the pair. */
import { type Method } from '../../catalog/types';
import { type SheetBuilder, workSheet } from '../../sheet';
import { input, optional, output } from '../common/describe';
import { SYSTEM_UNITS, type System, systemOf } from '../common/system';

const CLAUSE = 'ASME XIII / VIII-1 UG-127(a)(3), UG-132; API 520-1, combination factor; EN ISO 4126-3';

/** Combination factor without a certified one (ASME VIII-1 UG-127(a)(3), API 520-1; quoted in public articles). */
export const DEFAULT_KC = 0.9;

/** Kc: as certified for this pair, else 0.9. */
function factorStep(sheet: SheetBuilder): number {
  const given = sheet.has('Kc_certified');
  const Kc = given
    ? sheet.number('Kc_certified', '-', { above: 0, max: 1 }, 'K_c')
    : sheet.keep('Kc_certified', DEFAULT_KC, 'K_c');
  if (!given)
    sheet.warn(
      'KC_DEFAULT',
      'No certified combination factor of this disk and valve is given: 0.9 is taken.',
    );
  sheet.output('Kc', Kc);
  return Kc;
}

/** Burst against set: the disk must open before the valve would, and not so high that the valve hammers (90 to 100 % is practice). */
function burstStep(sheet: SheetBuilder, system: System): void {
  if (!sheet.has('marked_burst') || !sheet.has('set_pressure')) {
    sheet.warn(
      'BURST_NOT_COMPARED',
      'Burst pressure of the disk and set pressure of the valve are not both given: whether they belong together is not judged.',
    );
    return;
  }
  const { Pg } = SYSTEM_UNITS[system];
  const burst = sheet.number('marked_burst', Pg, { above: 0 }, 'p_b');
  const set = sheet.number('set_pressure', Pg, { above: 0 }, 'p_{set}');
  const ratio = sheet.step(
    { key: 'r', meaning: 'marked burst pressure over set pressure', value: burst / set, unit: '-' },
    (v) => `\\frac{${v('marked_burst')}}{${v('set_pressure')}}`,
  );
  sheet.output('burst_over_set', ratio);
  if (ratio > 1 + 1e-9)
    sheet.warn(
      'BURST_ABOVE_SET',
      'The disk is marked above the set pressure of the valve: the pair opens at the burst pressure, which then counts as the set.',
      'up to 1',
    );
  else if (ratio < 0.9)
    sheet.warn(
      'BURST_FAR_BELOW_SET',
      'The disk is marked below 90 % of the set pressure: it can burst and leave the valve shut behind it (common practice, API 520-1 from memory).',
      '0.9 to 1',
    );
}

/** The conditions of the pair; gives whether all of them are met. */
function conditions(sheet: SheetBuilder): boolean {
  const asked: [string, boolean, string][] = [
    [
      'non_fragmenting',
      false,
      'The disk is not said to be non-fragmenting: pieces can hold the valve shut or open.',
    ],
    [
      'space_watched',
      false,
      'The space between disk and valve is not said to be vented, drained or watched by a tell-tale: pressure in it raises the pressure at which the disk bursts.',
    ],
    [
      'disk_passes_valve',
      false,
      'The open area of the disk is not said to be at least that of the valve inlet.',
    ],
  ];
  return asked
    .map(([name, fallback, text]) => {
      const met = sheet.flag(name, fallback);
      if (!met) sheet.warn(name.toUpperCase(), text);
      return met;
    })
    .every(Boolean);
}

/** j.disk-with-valve: combination of rupture disk and relief valve. */
export const DISK_WITH_VALVE: Method = {
  id: 'j.disk-with-valve',
  version: 1,
  topic: 'j.disk-with-valve',
  title: 'Rupture disk under a relief valve: combination factor and capacity',
  editions: [
    'ASME XIII:2021; ASME VIII-1, UG-127 and UG-132; API 520-1, 7th to 10th edition',
    'EN ISO 4126-3:2020',
  ],
  source:
    'ASME VIII-1 UG-127(a)(3) and UG-132, API Standard 520 Part I, EN ISO 4126-3: combination factor 0.9 or as certified for the pair; clauses from memory',
  validity:
    'Disk at the inlet of a spring-loaded or pilot-operated valve, close-coupled; a certified factor only for the very pair of disk and valve that was tested. A disk at the outlet asks for other conditions.',
  inputs: [
    input('valve_capacity', 'capacity of the valve alone', 'mass-flow', { rangeKey: 'capacity' }),
    optional('Kc_certified', 'certified combination factor (0.9 when not given)', 'dimensionless', {
      rangeKey: 'kc',
    }),
    optional('W', 'required relief load, to be compared', 'mass-flow', { rangeKey: 'reliefLoad' }),
    optional('marked_burst', 'marked burst pressure of the disk', 'pressure-gauge', {
      rangeKey: 'burstPressure',
    }),
    optional('set_pressure', 'set pressure of the valve', 'pressure-gauge', { rangeKey: 'setPressure' }),
    optional('non_fragmenting', 'whether the disk is of a non-fragmenting kind (no when not given)'),
    optional('space_watched', 'whether the space between is vented or watched (no when not given)'),
    optional(
      'disk_passes_valve',
      'whether the open disk has at least the area of the valve inlet (no when not given)',
    ),
  ],
  outputs: [
    output('Kc', 'combination factor', 'dimensionless'),
    output('combined_capacity', 'capacity of the pair', 'mass-flow'),
    output('burst_over_set', 'marked burst pressure over set pressure', 'dimensionless'),
    output('conditions_met', 'whether the conditions of the pair are met'),
    output('suffices', 'whether the pair passes the load'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const system = systemOf(inputs, ['valve_capacity', 'W']);
      const { W: unit } = SYSTEM_UNITS[system];
      const valve = sheet.number('valve_capacity', unit, { above: 0 }, 'W_v');
      const Kc = factorStep(sheet);
      const W = sheet.step(
        {
          key: 'Wc',
          tex: 'W_c',
          meaning: 'capacity of the pair',
          value: Kc * valve,
          unit,
          clause: CLAUSE,
          memory: true,
        },
        (v) => `${v('Kc_certified')} \\cdot ${v('valve_capacity')}`,
      );
      sheet.output('combined_capacity', W, unit);
      burstStep(sheet, system);
      const met = conditions(sheet);
      sheet.output('conditions_met', met);
      sheet.say({
        symbol: '\\text{pair}',
        meaning: met
          ? 'the conditions of the pair are met'
          : 'not all conditions of the pair are met; see the warnings',
        value: met ? 'yes' : 'no',
        tex: '\\text{no fragments, space watched, disk passes the valve}',
        clause: CLAUSE,
      });
      if (sheet.has('W')) sheet.output('suffices', sheet.number('W', unit, { above: 0 }) <= W);
    });
  },
};
