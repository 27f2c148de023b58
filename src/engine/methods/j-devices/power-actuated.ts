/* Method j.power-actuated: how much of the stated capacity of a power-actuated relief valve may be relied on, and why. */
import { type Method } from '../../catalog/types';
import { type SheetBuilder, workSheet } from '../../sheet';
import { input, optional, output } from '../common/describe';
import { SYSTEM_UNITS, type System, systemOf } from '../common/system';

/** What the valve stands on, as words of the sheet. */
export const POWER_SERVICES = ['boiler', 'vessel'] as const;
const FAILS = ['open', 'shut', 'stays'] as const;

/** Share of the required capacity of a boiler that power-actuated valves may be credited with: ASME I PG-67.4 (from memory). */
export const BOILER_SHARE = 0.3;

/** Opening energy, independence and proof as the sheet knows them. */
export type Reliance = { fails: (typeof FAILS)[number]; independent: boolean; proven: boolean };

/** Capacity that may be credited, in the unit of both flows: all of it where nothing stands against it, a share on boilers, else 0. */
export function creditedCapacity(
  capacity: number,
  required: number,
  service: (typeof POWER_SERVICES)[number],
  { fails, independent, proven }: Reliance,
): number {
  if (!independent || !proven) return 0;
  if (service === 'boiler') return Math.min(capacity, BOILER_SHARE * required);
  return fails === 'open' ? capacity : 0;
}

/** One warning for each reason that stands against relying on the valve. */
function reasons(sheet: SheetBuilder, { fails, independent, proven }: Reliance, service: string): void {
  if (!independent)
    sheet.warn(
      'NOT_INDEPENDENT',
      'What opens the valve is shared with what can cause the overpressure (signal, energy, or the valve itself): nothing is credited.',
    );
  if (!proven)
    sheet.warn('NOT_PROVEN', 'No test of the whole loop at a stated interval is named: nothing is credited.');
  if (service === 'vessel' && fails !== 'open')
    sheet.warn('FAILS_SHUT', 'Without its energy the valve does not open: on a vessel nothing is credited.');
  if (service === 'boiler')
    sheet.warn(
      'SHARE_OF_BOILER',
      'On a boiler power-actuated valves are credited with at most 30 % of the required capacity; spring-loaded valves carry the rest.',
    );
}

function readReliance(sheet: SheetBuilder): Reliance {
  return {
    fails: sheet.word('fails_to', FAILS, 'shut'),
    independent: sheet.flag('independent', false),
    proven: sheet.flag('loop_tested', false),
  };
}

function creditStep(sheet: SheetBuilder, reliance: Reliance, system: System): void {
  const { W: unit } = SYSTEM_UNITS[system];
  const capacity = sheet.number('capacity', unit, { above: 0 }, 'W_c');
  const required = sheet.number('required_capacity', unit, { above: 0 }, 'W');
  const service = sheet.word('service', POWER_SERVICES, 'vessel');
  reasons(sheet, reliance, service);
  const value = creditedCapacity(capacity, required, service, reliance);
  const share = service === 'boiler' && value > 0;
  const credited = sheet.step(
    {
      key: 'Wcr',
      tex: 'W_{cr}',
      meaning: 'capacity that may be relied on',
      value,
      unit,
      clause: 'ASME I PG-67.4; ASME XIII',
      memory: true,
    },
    (v) =>
      value === 0
        ? '0'
        : share
          ? `\\min(${v('capacity')},\\ ${BOILER_SHARE} \\cdot ${v('required_capacity')})`
          : v('capacity'),
  );
  sheet.output('credited_capacity', credited, unit);
  const left = sheet.step(
    {
      key: 'left',
      tex: 'W_{rest}',
      meaning: 'capacity that self-actuated devices must carry',
      value: Math.max(0, required - credited),
      unit,
    },
    (v) => `\\max(0,\\ ${v('required_capacity')} - ${v('Wcr')})`,
  );
  sheet.output('remaining_capacity', left, unit);
  sheet.output('relied_on', credited > 0);
}

/** j.power-actuated: reliance on a power-actuated relief valve. */
export const POWER_ACTUATED: Method = {
  id: 'j.power-actuated',
  version: 1,
  topic: 'j.power-actuated',
  title: 'Power-actuated relief valve: what may be relied on',
  editions: ['ASME I, PG-67.4; ASME XIII:2021; EN ISO 4126-5:2013'],
  source:
    'ASME BPVC Section I PG-67.4 (30 % of the required capacity of a boiler), Section XIII on devices that need outside energy, EN ISO 4126-5 on controlled safety systems; from memory',
  validity:
    'Capacity as the maker states it at the relieving pressure. The sheet weighs whether the opening can be relied on; what the jurisdiction accepts in place of self-actuated devices, and credit by a safety integrity level, are decided outside of it.',
  inputs: [
    input('capacity', 'capacity of the valve at relieving pressure', 'mass-flow', { rangeKey: 'capacity' }),
    input('required_capacity', 'capacity that the scenario requires', 'mass-flow', {
      rangeKey: 'reliefLoad',
    }),
    optional('service', 'what the valve stands on (vessel when not given)', undefined, {
      words: [...POWER_SERVICES],
    }),
    optional('fails_to', 'where the valve goes without its energy (shut when not given)', undefined, {
      words: [...FAILS],
    }),
    optional(
      'independent',
      'whether signal, energy and valve are independent of the cause (no when not given)',
    ),
    optional('loop_tested', 'whether the whole loop is tested at a stated interval (no when not given)'),
  ],
  outputs: [
    output('credited_capacity', 'capacity that may be relied on', 'mass-flow'),
    output('remaining_capacity', 'capacity that other devices must carry', 'mass-flow'),
    output('relied_on', 'whether anything is relied on'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      creditStep(sheet, readReliance(sheet), systemOf(inputs, ['capacity', 'required_capacity']));
    });
  },
};
