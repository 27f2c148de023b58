/* Method f.vaporisation: heat in, less heat removed, boils the liquid at relieving pressure. */
import { type Method } from '../../catalog/types';
import { convert } from '../../quantity';
import { type SheetBuilder, texNumber, workSheet } from '../../sheet';
import { optional, input, output } from '../common/describe';
import { SYSTEM_UNITS, type System, systemOf } from '../common/system';
import { vaporisationStep } from './latent';

const CLAUSE = 'heat balance at relieving pressure';
const UA_UNIT: Record<System, string> = { SI: 'W/K', US: 'Btu/(h.degF)' };
const READING: Record<System, string> = { SI: 'degC', US: 'degF' };

/** Heat exchanged by a surface at a fixed UA, W (or any consistent unit). */
export function exchanged(UA: number, source: number, sink: number): number {
  return UA * (source - sink);
}

/** Heat in from the exchanger: UA with two temperatures. */
function fromExchanger(sheet: SheetBuilder, system: System): number {
  const UA = sheet.number('UA', UA_UNIT[system], { above: 0 }, 'U\\!A');
  const source = sheet.number('T_source', READING[system], {}, 'T_{source}');
  const sink = sheet.number('T_sink', READING[system], {}, 'T_{sink}');
  if (source <= sink) {
    const unit = system === 'SI' ? '°C' : '°F';
    sheet.refuse(
      'NO_HEAT',
      'T_source',
      `The source at ${texNumber(source)} ${unit} is not hotter than the sink at ${texNumber(sink)} ${unit}: no heat flows in.`,
    );
  }
  return sheet.step(
    {
      key: 'Qin',
      tex: 'Q_{in}',
      meaning: 'heat in through the surface',
      value: exchanged(UA, source, sink),
      unit: SYSTEM_UNITS[system].heat,
      clause: CLAUSE,
    },
    (v) => `${v('UA')} \\cdot (${v('T_source')} - ${v('T_sink')})`,
  );
}

/** Heat in, by duty or by UA and two temperatures; kept under the key `Qin`, in the system's unit. */
export function heatIn(sheet: SheetBuilder, system: System): number {
  if (sheet.has('Q')) {
    const duty = sheet.number('Q', SYSTEM_UNITS[system].heat, { min: 0 }, 'Q_{in}');
    return sheet.keep('Qin', duty, 'Q_{in}');
  }
  if (sheet.has('UA')) return fromExchanger(sheet, system);
  return sheet.refuse(
    'INPUT_MISSING',
    'Q',
    'The heat in is missing: give the duty (Q), or UA with T_source and T_sink.',
  );
}

/** f.vaporisation: vapour load of a heat balance. */
export const VAPORISATION: Method = {
  id: 'f.vaporisation',
  version: 1,
  topic: 'f.vaporisation',
  title: 'Vapour made by heat: W = Q/λ',
  editions: ['API 521, 5th to 7th edition'],
  source:
    'Heat balance at relieving conditions; the approach of API Standard 521 for loss of cooling, reflux and abnormal heat (no clause quoted)',
  validity:
    'Boiling liquid below its critical point; UA at relieving conditions, clean where that gives more; latent heat of the liquid that boils.',
  inputs: [
    optional('Q', 'heat in (duty)', 'power', { rangeKey: 'heatInput' }),
    optional('UA', 'heat transfer coefficient times area, in place of a duty', 'heat-conductance'),
    optional('T_source', 'temperature of the heating side', 'temperature'),
    optional('T_sink', 'temperature of the boiling side', 'temperature'),
    optional('Q_removed', 'heat still removed', 'power', { rangeKey: 'heatInput' }),
    input('latent_heat', 'latent heat at relief', 'specific-energy', { rangeKey: 'latentHeat' }),
  ],
  outputs: [
    output('heat', 'net heat that boils the liquid', 'power'),
    output('relief_load', 'vapour load', 'mass-flow'),
  ],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const system = systemOf(inputs, ['latent_heat', 'Q', 'UA']);
      const u = SYSTEM_UNITS[system];
      const gained = heatIn(sheet, system);
      const removed = sheet.number('Q_removed', u.heat, { min: 0, fallback: 0 }, 'Q_{out}');
      const heat = sheet.step(
        {
          key: 'q',
          tex: 'Q',
          meaning: 'net heat that boils the liquid',
          value: gained - removed,
          unit: u.heat,
          clause: CLAUSE,
        },
        (v) => `${v('Qin')} - ${v('Q_removed')}`,
      );
      if (heat <= 0) sheet.warn('NO_LOAD', 'As much heat is removed as comes in: no vapour is made.');
      sheet.output(
        'heat',
        system === 'SI' ? convert({ value: heat, unit: 'W' }, 'kW') : heat,
        system === 'SI' ? 'kW' : u.heat,
      );
      vaporisationStep(sheet, heat, system);
    });
  },
};
