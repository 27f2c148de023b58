/* Method f.reaction-heat: the heat of a known reaction rate boils the liquid at relieving pressure. */
import { type Method } from '../../catalog/types';
import { convert } from '../../quantity';
import { workSheet } from '../../sheet';
import { input, optional, output } from '../common/describe';
import { SYSTEM_UNITS, systemOf } from '../common/system';
import { vaporisationStep } from './latent';

/** Heat of a reaction from the rate of the reactant that limits it: (W/M)·ΔH, in consistent units. */
export function reactionHeat(rate: number, molarMass: number, heat: number): number {
  return (rate / molarMass) * heat;
}

/** f.reaction-heat: vapour made by a reaction whose rate is set by a feed. */
export const REACTION_HEAT: Method = {
  id: 'f.reaction-heat',
  version: 1,
  topic: 'f.reaction-heat',
  title: 'Reaction at a rate set by a feed: heat and vapour',
  editions: ['heat balance'],
  source:
    'Heat balance at relieving conditions: (reactant rate / molar mass) × heat of reaction / latent heat',
  validity:
    'Reaction held by the feed of one reactant, all of it consumed at once; no accumulation of reactant, no gas made. A runaway needs calorimetry.',
  inputs: [
    input('reactant_rate', 'feed of the reactant that limits the reaction', 'mass-flow', {
      rangeKey: 'reliefLoad',
    }),
    input('reactant_molar_mass', 'its molar mass', 'molar-mass', { rangeKey: 'molarMass' }),
    input('heat_of_reaction', 'heat set free by a mole of it', 'molar-energy'),
    optional('Q_removed', 'heat still removed', 'power', { rangeKey: 'heatInput' }),
    input('latent_heat', 'latent heat at relief', 'specific-energy', { rangeKey: 'latentHeat' }),
  ],
  outputs: [
    output('heat', 'net heat that boils the liquid', 'power'),
    output('relief_load', 'vapour load', 'mass-flow'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const system = systemOf(inputs, ['reactant_rate', 'latent_heat']);
      const u = SYSTEM_UNITS[system];
      const rate = sheet.number('reactant_rate', u.W, { above: 0 }, 'W_r');
      const M = sheet.number('reactant_molar_mass', u.M, { above: 0 }, 'M_r');
      const molar = system === 'SI' ? 'kJ/kmol' : 'Btu/lbmol';
      const dH = sheet.number('heat_of_reaction', molar, { above: 0 }, '\\Delta H_r');
      const removed = sheet.number('Q_removed', u.heat, { min: 0, fallback: 0 }, 'Q_{out}');
      const perHour = reactionHeat(rate, M, dH);
      const made = sheet.step(
        {
          key: 'Qr',
          tex: 'Q_r',
          meaning: 'heat of the reaction',
          value: system === 'SI' ? perHour / 3.6 : perHour,
          unit: u.heat,
        },
        (v) =>
          `${system === 'SI' ? '\\frac{1}{3.6} \\cdot ' : ''}\\frac{${v('reactant_rate')}}{${v('reactant_molar_mass')}} \\cdot ${v('heat_of_reaction')}`,
      );
      const heat = sheet.step(
        {
          key: 'q',
          tex: 'Q',
          meaning: 'net heat that boils the liquid',
          value: made - removed,
          unit: u.heat,
        },
        (v) => `${v('Qr')} - ${v('Q_removed')}`,
      );
      if (heat <= 0)
        sheet.warn('NO_LOAD', 'As much heat is removed as the reaction makes: no vapour is made.');
      const shown = system === 'SI' ? 'kW' : u.heat;
      sheet.output('heat', convert({ value: heat, unit: u.heat }, shown), shown);
      vaporisationStep(sheet, heat, system);
    });
  },
};
