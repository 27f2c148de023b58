/* The methods of devices: certified capacity, lift, vacuum, power and temperature, rupture disks, and devices in a group. */
import { type Method } from '../../catalog/types';
import { CERTIFIED_COEFFICIENT } from './certified-coefficient';
import { DISK_COEFFICIENT_METHOD } from './disk-coefficient';
import { DISK_RESISTANCE } from './disk-resistance';
import { DISK_TOLERANCE } from './disk-tolerance';
import { DISK_WITH_VALVE } from './disk-with-valve';
import { LOW_LIFT } from './low-lift';
import { NAMEPLATE } from './nameplate';
import { POWER_ACTUATED } from './power-actuated';
import { STAGGERED } from './staggered-group';
import { TEMPERATURE_ACTUATED } from './temperature-actuated';
import { VACUUM_RELIEF } from './vacuum-relief';

/** All methods of topic j. */
export const DEVICE_METHODS: readonly Method[] = [
  NAMEPLATE,
  CERTIFIED_COEFFICIENT,
  LOW_LIFT,
  VACUUM_RELIEF,
  POWER_ACTUATED,
  TEMPERATURE_ACTUATED,
  DISK_COEFFICIENT_METHOD,
  DISK_RESISTANCE,
  DISK_WITH_VALVE,
  DISK_TOLERANCE,
  STAGGERED,
];
