/* Method f.loss-of-reflux: the cold return to a column stops. */
import { type Method } from '../../catalog/types';
import { type SheetBuilder, workSheet } from '../../sheet';
import { optional, output } from '../common/describe';
import { SYSTEM_UNITS, systemOf } from '../common/system';
import {
  BALANCE,
  BALANCE_INPUTS,
  BALANCE_OUTPUTS,
  BALANCE_SYSTEM,
  balanceSteps,
  TOP_LATENT,
  VAPOUR_KEPT,
} from './balance';

/** Minutes until the condenser floods because its condensate is no longer drawn. */
function floodStep(sheet: SheetBuilder): void {
  if (!sheet.has('drum_free_volume')) return;
  const V = sheet.number('drum_free_volume', 'm3', { min: 0 }, 'V_{free}');
  const Q = sheet.number('condensate_flow', 'm3/h', { above: 0 }, 'Q_{cond,l}');
  const t = sheet.step(
    {
      key: 't',
      meaning: 'time until the drum is full and the condenser floods',
      value: (60 * V) / Q,
      unit: 'min',
    },
    (v) => `60 \\cdot \\frac{${v('drum_free_volume')}}{${v('condensate_flow')}}`,
  );
  sheet.output('time_to_flood', t, 'min');
}

/** f.loss-of-reflux: reflux or pump-around stops. */
export const LOSS_OF_REFLUX: Method = {
  ...BALANCE,
  id: 'f.loss-of-reflux',
  topic: 'f.loss-of-reflux',
  title: 'Loss of reflux or pump-around: vapour of the top stage',
  source:
    'API Standard 521, reflux failure: enthalpy balance over the section, condenser lost once it floods (approach from memory); heat balance',
  validity:
    'Balance over the section at relieving pressure; latent heat of the liquid of its top stage; the condenser is taken as flooded unless condenser_floods says no; a pump-around that stops removes nothing.',
  inputs: [
    ...BALANCE_INPUTS,
    optional(
      'Q_condenser',
      'duty of the condenser at relief, credited only when it does not flood',
      'power',
      { rangeKey: 'heatInput' },
    ),
    optional('condenser_floods', 'whether the condenser floods when reflux stops (yes when not given)'),
    optional('drum_free_volume', 'volume of the drum above the level at the start', 'volume', {
      rangeKey: 'volume',
    }),
    optional('condensate_flow', 'condensate flow into the drum', 'volume-flow'),
    VAPOUR_KEPT,
    TOP_LATENT,
  ],
  outputs: [...BALANCE_OUTPUTS, output('time_to_flood', 'time until the condenser floods', 'time')],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const system = systemOf(inputs, BALANCE_SYSTEM);
      const floods = sheet.flag('condenser_floods', true);
      floodStep(sheet);
      const duty = floods
        ? 0
        : sheet.number('Q_condenser', SYSTEM_UNITS[system].heat, { min: 0, fallback: 0 }, 'Q_c');
      if (floods && sheet.has('Q_condenser'))
        sheet.warn('CONDENSER_FLOODED', 'The condenser is taken as flooded: its duty is not credited.');
      balanceSteps(sheet, system, sheet.keep('Qcond', duty, floods ? '0' : 'Q_c'));
    });
  },
};
