/* The invented site's own names of load methods and of their inputs, in the engine's words. */
import { type Input } from '@domain/basis';

/** Site methods of theirs → methods of the engine. */
export const LOAD_METHODS: Readonly<Record<string, string>> = {
  'x.heat-balance': 'f.vaporisation',
  'x.reaction-heat': 'f.reaction-heat',
  'x.stated-rate': 'f.stated-rate',
  'x.compressor-rate': 'f.compressor-rate',
  'x.positive-displacement': 'f.positive-displacement',
};

const NAMES: Readonly<Record<string, Readonly<Record<string, string>>>> = {
  'x.heat-balance': {
    source_temperature: 'T_source',
    sink_temperature: 'T_sink',
    duty: 'Q',
    heat_removed: 'Q_removed',
  },
  'x.reaction-heat': { hydrogen_rate: 'reactant_rate', hydrogen_molar_mass: 'reactant_molar_mass' },
  'e.fire-unwetted': { wall_temperature: 'T_wall' },
};

/** Inputs of a method of theirs under the engine's names; what a fluid knows is left to the document. */
export function renamed(method: string, inputs: Record<string, Input>): Record<string, Input> {
  const names = NAMES[method] ?? {};
  return Object.fromEntries(Object.entries(inputs).map(([name, input]) => [names[name] ?? name, input]));
}
