/* Method k.weighted-vent: pallet loaded by weight or spring, where it lets go and what it passes when it is fully open. */
import { type Method } from '../../catalog/types';
import { convert, fromSI, toSI } from '../../quantity';
import { type SheetBuilder, workSheet } from '../../sheet';
import { optional, output } from '../common/describe';
import { barometer } from '../common/pressures';
import { SYSTEM_UNITS, type System, systemOf } from '../common/system';
import { airVolume } from './air';
import { airTemperature, DIRECTIONS, fluxStep, VENT_INPUTS } from './vent-steps';
import { GRAVITY, palletSet, palletState } from './vent';

const CLAUSE = 'balance of forces on the pallet';
const CLAIM = 'a vent is claimed from its certified full flow on';

/** The seat area in m², from the area or the diameter. */
function seatArea(sheet: SheetBuilder): number {
  if (sheet.has('seat_area')) return sheet.keep('As', sheet.number('seat_area', 'm2', { above: 0 }), 'A_s');
  const d = sheet.number('seat_diameter', 'm', { above: 0 }, 'd_s');
  return sheet.step(
    { key: 'As', tex: 'A_s', meaning: 'area of the seat', value: (Math.PI / 4) * d ** 2, unit: 'm2' },
    (v) => `\\frac{\\pi}{4} ${v('seat_diameter')}^2`,
  );
}

/** The set as a difference in Pa: as given (then the mass for it is told), or from weight and spring. */
function setStep(sheet: SheetBuilder, area: number): number {
  if (sheet.has('set_pressure')) {
    const set = Math.abs(sheet.number('set_pressure', 'Pa_g', {}, 'p_{set}'));
    sheet.keep('ps', set, 'p_{set}');
    const mass = sheet.step(
      {
        key: 'm',
        meaning: 'mass of the pallet that gives this set without a spring',
        value: (set * area) / GRAVITY,
        unit: 'kg',
        clause: CLAUSE,
      },
      (v) => `\\frac{${v('ps')} \\cdot ${v('As')}}{9.806\\,65}`,
    );
    sheet.output('pallet_mass', mass, 'kg');
    return set;
  }
  if (!sheet.has('pallet_mass') && !sheet.has('spring_force'))
    sheet.refuse(
      'INPUT_MISSING',
      'pallet_mass',
      'The load of the pallet is missing: give its mass, its spring force, or the set pressure.',
    );
  const mass = sheet.number('pallet_mass', 'kg', { min: 0, fallback: 0 }, 'm');
  const spring = sheet.number('spring_force', 'N', { min: 0, fallback: 0 }, 'F_s');
  return sheet.step(
    {
      key: 'ps',
      tex: 'p_{set}',
      meaning: 'pressure difference at which the pallet lets go',
      value: palletSet(mass, spring, area),
      unit: 'Pa',
      clause: CLAUSE,
    },
    (v) => `\\frac{${v('pallet_mass')} \\cdot 9.806\\,65 + ${v('spring_force')}}{${v('As')}}`,
  );
}

type Loaded = { set: number; area: number; vacuum: boolean; system: System };

/** A gauge pressure of the vent as a positive difference in Pa. */
function difference(sheet: SheetBuilder, name: string, tex: string): number {
  return Math.abs(sheet.number(name, 'Pa_g', {}, tex));
}

/** What passes at the pressure asked: nothing is claimed before full flow. */
function flowSteps(sheet: SheetBuilder, vent: Loaded): void {
  const { set, vacuum, system } = vent;
  const full = sheet.has('full_flow_pressure')
    ? difference(sheet, 'full_flow_pressure', 'p_{full}')
    : undefined;
  const p = sheet.has('pressure') ? difference(sheet, 'pressure', 'p') : (full ?? set);
  if (full === undefined)
    sheet.warn(
      'FULL_FLOW_NOT_GIVEN',
      'The certified pressure of full flow is not given: the figure holds only if the vent is fully open at this pressure. Weight-loaded vents commonly need 80 % to 100 % above set (common practice, no source).',
    );
  else if (full < set)
    sheet.refuse(
      'ORDER_OF_PRESSURES',
      'full_flow_pressure',
      'The pressure of full flow is below the set pressure of the vent.',
    );
  const state = palletState(p, set, full ?? set);
  sheet.output('state', state);
  const texts = {
    shut: 'the pallet stays on its seat',
    opening: 'the pallet lifts; nothing is claimed',
    full: 'the vent is fully open',
  };
  sheet.say({
    symbol: '\\text{state}',
    meaning: texts[state],
    value: state,
    tex: `p = ${Number(p.toPrecision(6))}\\,\\text{Pa}`,
    clause: CLAIM,
  });
  if (state === 'opening')
    sheet.warn(
      'PARTLY_OPEN',
      'Between set and full flow only the maker’s curve tells what passes; nothing is claimed here.',
    );
  const atmosphere = convert({ value: barometer(sheet, system), unit: SYSTEM_UNITS[system].P }, 'Pa_abs');
  const inside = vacuum ? atmosphere - p : atmosphere + p;
  if (inside <= 0)
    sheet.refuse('VALUE_IMPOSSIBLE', 'pressure', 'The vacuum asked for is deeper than the atmosphere.');
  const flux = fluxStep(sheet, inside, atmosphere, airTemperature(sheet));
  capacitySteps(sheet, state === 'full' ? flux : 0, vent);
}

function capacitySteps(sheet: SheetBuilder, flux: number, { area, system }: Loaded): void {
  const Kd = sheet.number('Kd', '-', { above: 0, max: 1 }, 'K_d');
  const A = sheet.has('flow_area')
    ? sheet.number('flow_area', 'm2', { above: 0 }, 'A')
    : sheet.keep('flow_area', area, 'A_s');
  const mass = Kd * A * flux;
  const { W } = SYSTEM_UNITS[system];
  sheet.step(
    { key: 'W', meaning: 'air passed when fully open, as claimed', value: mass, unit: 'kg/s' },
    (v) => (flux === 0 ? '0' : `${v('Kd')} \\cdot ${v('flow_area')} \\cdot ${v('G')}`),
  );
  const unit = system === 'US' ? 'SCFH' : 'Nm3/h';
  sheet.output('W_rated', fromSI(mass, W).value, W);
  sheet.output('capacity_air', fromSI(airVolume(mass), unit).value, unit);
}

/** k.weighted-vent: pallet vent loaded by weight or spring. */
export const WEIGHTED_VENT: Method = {
  id: 'k.weighted-vent',
  version: 1,
  topic: 'k.weighted-vent',
  title: 'Weight- or spring-loaded pallet vent: set and capacity',
  editions: ['ISO 28300:2008; API 2000, 6th and 7th edition'],
  source:
    'Balance of forces on the pallet; isentropic nozzle of air for the flow; full flow as ISO 28300 has it certified (from memory)',
  validity:
    'Pallet at rest on its seat up to set; fully open from the certified pressure of full flow on; nothing claimed between. Backpressure on the pallet other than the atmosphere is not counted.',
  inputs: [
    optional('pallet_mass', 'mass of the pallet with its weights', 'mass'),
    optional('spring_force', 'force of the spring on the closed pallet', 'force'),
    optional('set_pressure', 'set pressure, when it is known and the mass is sought', 'pressure-gauge'),
    optional('seat_area', 'area inside the seat', 'area'),
    optional('seat_diameter', 'diameter inside the seat, in place of the area', 'length', {
      rangeKey: 'nominalSize',
    }),
    optional('flow_area', 'flow area of the open vent (that of the seat when not given)', 'area', {
      rangeKey: 'orificeArea',
    }),
    optional(
      'full_flow_pressure',
      'certified pressure of full flow; vacuum with either sign',
      'pressure-gauge',
    ),
    optional(
      'pressure',
      'pressure at which the flow is asked (that of full flow when not given)',
      'pressure-gauge',
    ),
    optional('direction', 'whether the vent lets out or in (out when not given)', undefined, {
      words: [...DIRECTIONS],
    }),
    ...VENT_INPUTS,
  ],
  outputs: [
    output('set_pressure', 'set pressure (negative for a vacuum pallet)', 'pressure-gauge'),
    output('pallet_mass', 'mass of the pallet for the set', 'mass'),
    output('state', 'shut, opening or full at the pressure asked'),
    output('mass_flux', 'theoretical mass flux of air', 'mass-flux'),
    output('choked', 'whether the vent is choked'),
    output('W_rated', 'air passed, as claimed', 'mass-flow'),
    output('capacity_air', 'the same as a volume', 'normal-volume-flow'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const system = systemOf(inputs, [
        'full_flow_pressure',
        'set_pressure',
        'pallet_mass',
        'seat_area',
        'seat_diameter',
      ]);
      const vacuum = sheet.word('direction', DIRECTIONS, 'out') === 'in';
      const area = seatArea(sheet);
      const set = setStep(sheet, area);
      const unit = system === 'US' ? 'psig' : 'mbar_g';
      sheet.output('set_pressure', ((vacuum ? -1 : 1) * set) / toSI({ value: 1, unit }), unit);
      flowSteps(sheet, { set, area, vacuum, system });
    });
  },
};
