/* The methods of storage tanks: normal breathing, emergency venting, blanket gas, and their vents. */
import { type Method } from '../../catalog/types';
import { BLANKET_REGULATOR } from './blanket-regulator';
import { EMERGENCY_VENTING } from './emergency-venting';
import { IN_BREATHING } from './in-breathing';
import { OUT_BREATHING } from './out-breathing';
import { VENT_AREA } from './vent-area';
import { WEIGHTED_VENT } from './weighted-vent';

/** All methods of topic k, in the order of a tank study: what must pass, then what passes it. */
export const TANK_METHODS: readonly Method[] = [
  OUT_BREATHING,
  IN_BREATHING,
  EMERGENCY_VENTING,
  BLANKET_REGULATOR,
  VENT_AREA,
  WEIGHTED_VENT,
];
