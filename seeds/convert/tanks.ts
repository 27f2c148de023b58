/* Tank venting of the invented site under the engine's names: methods, and inputs used from the tank and its fluids. */
import { type Input } from '@domain/basis';
import { type DemoInput, type DemoQ, type DemoSheet, type DemoSystem } from './demo-types';
import { fluidId } from './fluids';
import { idOf } from './ids';

/** The engine's name of each site method of tank venting. */
export const TANK_METHODS: Record<string, string> = {
  't.tank-outbreathing': 'k.out-breathing',
  't.tank-inbreathing': 'k.in-breathing',
  't.tank-fire': 'k.emergency-venting',
  't.blanket-regulator': 'k.blanket-regulator',
  't.vent-area': 'k.vent-area',
};

const NAMES: Record<string, string> = { diameter: 'D', shell_height: 'H' };
const GAS = ['T', 'M', 'Z', 'k'];

type Place = { field: string; q: DemoQ | undefined };

/** Where the tank itself holds a figure that a sheet states, when both say the same. */
function fromTank(name: string, input: DemoInput, system: DemoSystem): Input | undefined {
  const tank = system.equipment[0];
  if (!tank) return undefined;
  const places: Record<string, Place> = {
    tank_volume: { field: 'volume', q: tank.volume },
    diameter: { field: 'shape/diameter', q: tank.inside_diameter },
    shell_height: { field: 'levels/high', q: tank.levels?.high },
  };
  const place = places[name];
  if (place?.q?.value !== input.value || place.q.unit !== input.unit) return undefined;
  return { use: `equipment/${idOf('eq', tank.tag)}/${place.field}` };
}

/** The state of the blanket gas, used from the fluid that the sheet names. */
function upstream(sheet: DemoSheet): [string, Input][] {
  const fluid = sheet.inputs['upstream_fluid']?.value;
  if (typeof fluid !== 'string') return [];
  return GAS.map((name): [string, Input] => [name, { use: `fluids/${fluidId(fluid)}/${name}` }]);
}

/** Inputs of a sheet of tank venting; `inputs` are those converted as they stand. */
export function tankInputs(
  sheet: DemoSheet,
  inputs: Record<string, Input>,
  system: DemoSystem,
): Record<string, Input> {
  const own = Object.entries(inputs).flatMap(([name, input]): [string, Input][] => {
    const stated = sheet.inputs[name];
    if (name === 'upstream_fluid' || stated === undefined) return [];
    return [[NAMES[name] ?? name, fromTank(name, stated, system) ?? input]];
  });
  return Object.fromEntries([...own, ...upstream(sheet)]);
}
