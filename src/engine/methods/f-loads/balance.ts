/* Heat and vapour balance at the relieving pressure, shared by the loss of cooling, of an air cooler and of reflux. */
import { type MethodInput } from '../../catalog/types';
import { convert } from '../../quantity';
import { type SheetBuilder } from '../../sheet';
import { input, optional, output } from '../common/describe';
import { SYSTEM_UNITS, type System } from '../common/system';
import { vaporisationStep } from './latent';
import { heatIn } from './vaporisation';

const CLAUSE = 'heat and vapour balance at relieving pressure';

/** Heat that is left to make vapour: in + with the feed − removed elsewhere − still condensed. Any one unit. */
export function heatLeft(gained: number, feed: number, removed: number, condensed: number): number {
  return gained + feed - removed - condensed;
}

/** Inputs of the heat that comes in and of what is removed elsewhere. */
export const BALANCE_INPUTS: readonly MethodInput[] = [
  optional('Q', 'heat in (reboiler duty at relieving pressure)', 'power', { rangeKey: 'heatInput' }),
  optional(
    'UA',
    'heat transfer coefficient times area of the reboiler, in place of a duty',
    'heat-conductance',
  ),
  optional('T_source', 'temperature of the heating side', 'temperature'),
  optional('T_sink', 'temperature of the boiling side at relieving pressure', 'temperature'),
  optional(
    'Q_feed',
    'heat of the feed above its bubble point at relieving pressure (negative when colder)',
    'power',
  ),
  optional('Q_removed', 'heat removed elsewhere that surely goes on', 'power', { rangeKey: 'heatInput' }),
];
/** The latent heat of the top stage. */
export const TOP_LATENT = input(
  'latent_heat',
  'latent heat of the liquid of the top stage at relief',
  'specific-energy',
  {
    rangeKey: 'latentHeat',
  },
);
/** The vapour that leaves all the same. */
export const VAPOUR_KEPT = optional(
  'vapour_kept',
  'vapour that surely leaves by outlets that stay open',
  'mass-flow',
);
/** What each balance gives. */
export const BALANCE_OUTPUTS = [
  output('heat', 'heat left to make vapour', 'power'),
  output('vapour_made', 'vapour made', 'mass-flow'),
  output('relief_load', 'relief load', 'mass-flow'),
];

/** The balance, the vapour and what of it is relieved; `condensed` is the heat that the condenser still takes. */
export function balanceSteps(sheet: SheetBuilder, system: System, condensed: number): void {
  const u = SYSTEM_UNITS[system];
  const gained = heatIn(sheet, system);
  const feed = sheet.number('Q_feed', u.heat, { fallback: 0 }, 'Q_{feed}');
  const removed = sheet.number('Q_removed', u.heat, { min: 0, fallback: 0 }, 'Q_{out}');
  const heat = sheet.step(
    {
      key: 'q',
      tex: 'Q',
      meaning: 'heat left to make vapour',
      value: heatLeft(gained, feed, removed, condensed),
      unit: u.heat,
      clause: CLAUSE,
    },
    (v) => `${v('Qin')} + ${v('Q_feed')} - ${v('Q_removed')} - ${v('Qcond')}`,
  );
  if (heat <= 0) sheet.warn('NO_LOAD', 'As much heat is removed as comes in: no vapour is left to relieve.');
  const shown = system === 'SI' ? 'kW' : u.heat;
  sheet.output('heat', convert({ value: heat, unit: u.heat }, shown), shown);
  const made = vaporisationStep(sheet, heat, system);
  const kept = sheet.number('vapour_kept', u.W, { min: 0, fallback: 0 }, 'W_{out}');
  const load = sheet.step(
    {
      key: 'Wr',
      tex: 'W_r',
      meaning: 'vapour to be relieved',
      value: Math.max(0, made - kept),
      unit: u.W,
      clause: CLAUSE,
    },
    (v) => `\\max(0,\\ ${v('W')} - ${v('vapour_kept')})`,
  );
  sheet.output('vapour_made', made, u.W);
  sheet.output('relief_load', load, u.W);
}

/** What the three methods say alike. */
export const BALANCE = {
  version: 1,
  editions: ['API 521, 5th to 7th edition (approach)'],
  outputs: BALANCE_OUTPUTS,
};
/** The inputs that tell the unit system, first come first. */
export const BALANCE_SYSTEM = ['latent_heat', 'Q', 'UA'];
