/* Methods f.loss-of-cooling and f.air-cooler-failure: vapour that is no longer condensed. */
import { type Method } from '../../catalog/types';
import { type SheetBuilder, workSheet } from '../../sheet';
import { input, optional } from '../common/describe';
import { SYSTEM_UNITS, type System, systemOf } from '../common/system';
import { BALANCE, BALANCE_INPUTS, BALANCE_SYSTEM, balanceSteps, TOP_LATENT, VAPOUR_KEPT } from './balance';

/** The heat that the condenser still takes when only a share of it is lost. */
function partialStep(sheet: SheetBuilder, system: System): number {
  const u = SYSTEM_UNITS[system];
  const duty = sheet.number('Q_condenser', u.heat, { min: 0 }, 'Q_c');
  const lost = sheet.number('share_lost', '-', { min: 0, max: 1 }, 's');
  return sheet.step(
    {
      key: 'Qcond',
      tex: 'Q_{cond}',
      meaning: 'heat that the condenser still takes',
      value: duty * (1 - lost),
      unit: u.heat,
    },
    (v) => `(1 - ${v('share_lost')}) \\cdot ${v('Q_condenser')}`,
  );
}

/** f.loss-of-cooling: cooling water to condensers fails, wholly or in part. */
export const LOSS_OF_COOLING: Method = {
  ...BALANCE,
  id: 'f.loss-of-cooling',
  topic: 'f.loss-of-cooling',
  title: 'Loss of cooling water: vapour no longer condensed',
  source:
    'API Standard 521, cooling failure: all vapour to the condenser at relieving conditions (approach from memory); heat balance',
  validity:
    'Balance over the system at relieving pressure; reboiler reduced only by UA at the higher boiling point; feed as it enters; reflux taken as lost when its drum is empty (10 to 15 minutes).',
  inputs: [
    ...BALANCE_INPUTS,
    optional('Q_condenser', 'duty of the condenser at relief, for a partial loss', 'power', {
      rangeKey: 'heatInput',
    }),
    optional('share_lost', 'share of that duty that is lost (1 when not given)', 'dimensionless'),
    VAPOUR_KEPT,
    TOP_LATENT,
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const system = systemOf(inputs, BALANCE_SYSTEM);
      const partial = sheet.has('share_lost');
      const kept = partial ? partialStep(sheet, system) : sheet.keep('Qcond', 0, '0');
      balanceSteps(sheet, system, kept);
    });
  },
};

/** Natural draught that may be credited without a rating, and the most that a rating may give (common practice, no source). */
export const NATURAL_DRAUGHT = { usual: 0.2, most: 0.3 };

/** f.air-cooler-failure: fans stop or louvres shut. */
export const AIR_COOLER_FAILURE: Method = {
  ...BALANCE,
  id: 'f.air-cooler-failure',
  topic: 'f.air-cooler-failure',
  title: 'Air-cooler fans or louvres fail: vapour beyond natural draught',
  source:
    'API Standard 521, air-cooled exchanger failure: credit for natural draught (approach from memory); 20 % usual and at most 30 % by rating are common practice, no source; heat balance',
  validity:
    'Balance at relieving pressure; natural draught 0.2 of the duty unless rated, none with louvres shut; fans on several feeders give their share.',
  inputs: [
    ...BALANCE_INPUTS,
    input('Q_condenser', 'duty of the air cooler at relief', 'power', { rangeKey: 'heatInput' }),
    optional('natural_draught', 'share of the duty by natural draught (0.2 when not given)', 'dimensionless'),
    optional('louvres_shut', 'whether the louvres shut (then no credit)'),
    VAPOUR_KEPT,
    TOP_LATENT,
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const system = systemOf(inputs, BALANCE_SYSTEM);
      const shut = sheet.flag('louvres_shut', false);
      const given = sheet.number(
        'natural_draught',
        '-',
        { min: 0, max: 1, fallback: NATURAL_DRAUGHT.usual },
        's',
      );
      const duty = sheet.number('Q_condenser', SYSTEM_UNITS[system].heat, { min: 0 }, 'Q_c');
      if (given > NATURAL_DRAUGHT.most && !shut)
        sheet.warn(
          'DRAUGHT_HIGH',
          'More than 30 % by natural draught needs a rating of the exchanger at relieving conditions.',
          'up to 0.3',
        );
      const kept = sheet.step(
        {
          key: 'Qcond',
          tex: 'Q_{cond}',
          meaning: shut ? 'louvres shut: no heat by natural draught' : 'heat by natural draught',
          value: shut ? 0 : duty * given,
          unit: SYSTEM_UNITS[system].heat,
        },
        (v) => (shut ? '0' : `${v('natural_draught')} \\cdot ${v('Q_condenser')}`),
      );
      balanceSteps(sheet, system, kept);
    });
  },
};
