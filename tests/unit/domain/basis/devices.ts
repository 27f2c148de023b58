/* The 37 devices of the invented site with the axes that say what they are, and the kind that the site calls them. */
import type { Axes, Code, Purpose } from '@domain/basis';

export type Device = { tag: string; kind: string; axes: Axes; purpose: Purpose; code: Code };

const ASME: Code = { basis: 'asme-viii-1', units: 'SI' };
const EN: Code = { basis: 'en', units: 'SI' };
const SPRING: Axes = {
  actuation: ['pressure'],
  holds: 'spring',
  recloses: 'yes',
  balance: 'none',
  action: 'pop',
  lift: 'full',
  direction: 'over',
  certifiedFor: ['gas', 'liquid'],
};

function devices(
  tags: string,
  kind: string,
  axes: Partial<Axes> = {},
  purpose: Purpose = 'process',
  code = ASME,
): Device[] {
  return tags.split(' ').map((tag) => ({ tag, kind, axes: { ...SPRING, ...axes }, purpose, code }));
}

const liquid: Partial<Axes> = { certifiedFor: ['liquid'], action: 'proportional' };
const pallet: Partial<Axes> = { holds: 'weight', certifiedFor: ['gas'], direction: 'both' };
const disk: Partial<Axes> = { recloses: 'disk', holds: 'element' };

export const DEVICES: readonly Device[] = [
  ...devices('PSV-101A PSV-101B PSV-101C', 'balanced bellows', { balance: 'bellows' }),
  ...devices('PSV-110A PSV-110B PSV-206A PSV-206B PSV-306 PSV-311 PSV-312', 'conventional'),
  ...devices('PSV-115 PSV-201A PSV-201B PSV-410A PSV-410B', 'safety relief valve'),
  ...devices('RD-115', 'rupture disk', disk, 'shields-a-valve'),
  ...devices('PSV-116', 'relief valve', liquid),
  ...devices('PSV-301A PSV-301B', 'pilot-operated', { actuation: ['pilot'], holds: 'dome' }),
  ...devices('PRV-302', 'power-actuated', { actuation: ['power'] }),
  ...devices('RD-305', 'rupture disk', disk),
  ...devices('TRV-305', 'relief valve', liquid, 'thermal'),
  ...devices('PSV-308A PSV-308B', 'balanced piston', { ...liquid, balance: 'piston' }),
  ...devices('PSV-401A PSV-401B', 'safety valve', { certifiedFor: ['steam'] }),
  ...devices('TPRV-430', 'temperature-actuated', { actuation: ['pressure', 'temperature'] }, 'thermal'),
  ...devices('PSV-440A PSV-440B', 'full-lift', { certifiedFor: ['gas'] }, 'process', EN),
  ...devices('PVV-501A PVV-501B PVV-502', 'vacuum relief valve', pallet, 'breathing'),
  ...devices('VRV-502', 'vacuum relief valve', { ...pallet, direction: 'under' }, 'breathing'),
  ...devices('EV-501 EV-502', 'emergency vent', { holds: 'weight', certifiedFor: ['gas'] }, 'emergency-vent'),
  ...devices('TRV-505A TRV-505B', 'low-lift', { ...liquid, lift: 'low' }, 'thermal', EN),
];
