/* Kinds of device of the invented site as the eight axes from which our names are derived. */
import { type Axes, type ReliefPoint } from '@domain/basis';
import { type DemoDevice } from './demo-types';

/** True for pallets, weights and covers of storage tanks. */
export function isVent(device: DemoDevice): boolean {
  return device.lift === 'pallet';
}

function actuationOf(device: DemoDevice): Axes['actuation'] {
  if (device.kind === 'pilot-operated') return ['pilot'];
  if (device.kind === 'power-actuated') return ['power'];
  return device.kind === 'temperature-actuated' ? ['pressure', 'temperature'] : ['pressure'];
}

function holdsOf(device: DemoDevice): Axes['holds'] {
  if (device.burst) return 'element';
  if (isVent(device)) return 'weight';
  return device.kind === 'pilot-operated' ? 'dome' : 'spring';
}

function actionOf(device: DemoDevice): Axes['action'] {
  if (device.lift === 'full, modulating pilot') return 'modulating';
  const proportional =
    isVent(device) || device.lift?.includes('proportional') === true || device.lift === 'low';
  return proportional ? 'proportional' : 'pop';
}

function directionOf(device: DemoDevice): Axes['direction'] {
  if (!device.set_vacuum) return 'over';
  return device.set_pressure ? 'both' : 'under';
}

/** Safety relief valves are certified for gas and liquid, safety valves for gas or steam, relief valves for liquid. */
function certifiedFor(device: DemoDevice): Axes['certifiedFor'] {
  if (device.service === 'water and steam') return ['steam', 'liquid'];
  if (device.service === 'steam') return ['steam'];
  if (device.service === 'liquid') return ['liquid'];
  return device.function === 'safety relief valve' ? ['gas', 'liquid'] : ['gas'];
}

/** The axes of a device. */
export function axesOf(device: DemoDevice): Axes {
  return {
    actuation: actuationOf(device),
    holds: holdsOf(device),
    recloses: device.burst ? 'disk' : 'yes',
    balance: device.balance === 'bellows' || device.balance === 'piston' ? device.balance : 'none',
    action: actionOf(device),
    lift: device.lift === 'low' ? 'low' : 'full',
    direction: directionOf(device),
    certifiedFor: certifiedFor(device),
  };
}

/** What a device is there for. */
export function purposeOf(device: DemoDevice): ReliefPoint['purpose'] {
  if (device.kind === 'emergency vent') return 'emergency-vent';
  if (device.in_combination_with !== undefined) return 'shields-a-valve';
  if (isVent(device)) return 'breathing';
  return device.function?.includes('thermal') === true ? 'thermal' : 'process';
}

const DUTIES: Record<string, ReliefPoint['duty']> = {
  'gas or vapour': 'gas',
  steam: 'steam',
  liquid: 'liquid',
  'water and steam': 'mixed',
};

/** The state that a device mostly relieves. */
export function dutyOf(device: DemoDevice): ReliefPoint['duty'] {
  return DUTIES[device.service] ?? 'mixed';
}
