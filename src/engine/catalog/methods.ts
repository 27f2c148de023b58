/* The list of every method, in the order of the reference topics. */
import { GAS_BACKPRESSURE } from '../methods/a-gas/backpressure';
import { GAS } from '../methods/a-gas/gas';
import { GAS_C } from '../methods/a-gas/gas-c';
import { RATED } from '../methods/a-gas/rated';
import { RATED_STEAM } from '../methods/b-steam/rated';
import { STEAM_KSH } from '../methods/b-steam/ksh';
import { STEAM } from '../methods/b-steam/steam';
import { WATER_PROPERTIES } from '../methods/b-steam/water-properties';
import { LIQUID_BACKPRESSURE } from '../methods/c-liquid/backpressure';
import { LIQUID } from '../methods/c-liquid/liquid';
import { LIQUID_NONCERTIFIED } from '../methods/c-liquid/noncertified';
import { RATED_LIQUID } from '../methods/c-liquid/rated';
import { VISCOSITY_FACTOR } from '../methods/c-liquid/viscosity';
import { TWO_PHASE_METHODS } from '../methods/d-two-phase';
import { FIRE_SUPERCRITICAL } from '../methods/e-fire/supercritical';
import { FIRE_UNWETTED } from '../methods/e-fire/unwetted';
import { FIRE_INSULATION } from '../methods/e-fire/insulation';
import { FIRE_WETTED } from '../methods/e-fire/wetted';
import { BLOCKED_OUTLET } from '../methods/f-loads/blocked-outlet';
import { CHECK_VALVE } from '../methods/f-loads/check-valve';
import { CONTROL_VALVE_GAS, GAS_BLOWBY } from '../methods/f-loads/control-valve-gas';
import { CONTROL_VALVE_LIQUID } from '../methods/f-loads/control-valve-liquid';
import { AIR_COOLER_FAILURE, LOSS_OF_COOLING } from '../methods/f-loads/loss-of-cooling';
import { LOSS_OF_REFLUX } from '../methods/f-loads/loss-of-reflux';
import { BLOCKED_IN_RISE } from '../methods/f-loads/blocked-in';
import { BLOWBY_DISPLACEMENT } from '../methods/f-loads/blowby-displacement';
import { CLEAN_EXCHANGER } from '../methods/f-loads/clean-exchanger';
import { COMPRESSOR_CURVE } from '../methods/f-loads/compressor-curve';
import { INADVERTENT_OPENING } from '../methods/f-loads/inadvertent';
import { INFLOW_BALANCE } from '../methods/f-loads/inflow-balance';
import { DISPLACEMENT, OVERFILLING } from '../methods/f-loads/overfilling';
import { POOLED } from '../methods/f-loads/pooled';
import { COMPRESSOR_RATE, POSITIVE_DISPLACEMENT, STATED_RATE } from '../methods/f-loads/rates';
import { REACTION_GASSY } from '../methods/f-loads/reaction-gassy';
import { REACTION_HEAT } from '../methods/f-loads/reaction-heat';
import { REACTION_TEMPERED } from '../methods/f-loads/reaction-tempered';
import { SETTLE_OUT } from '../methods/f-loads/settle-out';
import { VACUUM_INFLOW } from '../methods/f-loads/vacuum-inflow';
import { CONTROL_VALVE_BYPASS } from '../methods/f-loads/valve-bypass';
import { THERMAL_EXPANSION } from '../methods/f-loads/thermal';
import { TUBE_RUPTURE } from '../methods/f-loads/tube-rupture';
import { VAPORISATION } from '../methods/f-loads/vaporisation';
import { LINE_METHODS } from '../methods/g-lines';
import { ACCUMULATION } from '../methods/h-limits/accumulation';
import { SET_TOLERANCE } from '../methods/h-limits/tolerance';
import { ISO_GAS, ISO_LIQUID, ISO_STEAM } from '../methods/i-iso4126/iso';
import { LETTERS } from '../methods/i-letters/letter-method';
import { DEVICE_METHODS } from '../methods/j-devices';
import { TANK_METHODS } from '../methods/k-tanks';
import { PROPERTY_METHODS } from '../methods/p-properties';
import { type Method } from './types';

/** All methods of the engine. */
export const METHODS: readonly Method[] = [
  GAS_BACKPRESSURE,
  GAS,
  GAS_C,
  RATED,
  STEAM,
  STEAM_KSH,
  RATED_STEAM,
  WATER_PROPERTIES,
  LIQUID_BACKPRESSURE,
  LIQUID,
  LIQUID_NONCERTIFIED,
  VISCOSITY_FACTOR,
  RATED_LIQUID,
  ...TWO_PHASE_METHODS,
  FIRE_INSULATION,
  FIRE_SUPERCRITICAL,
  FIRE_UNWETTED,
  FIRE_WETTED,
  BLOCKED_OUTLET,
  CHECK_VALVE,
  CONTROL_VALVE_GAS,
  CONTROL_VALVE_LIQUID,
  GAS_BLOWBY,
  THERMAL_EXPANSION,
  TUBE_RUPTURE,
  VAPORISATION,
  COMPRESSOR_CURVE,
  COMPRESSOR_RATE,
  POSITIVE_DISPLACEMENT,
  STATED_RATE,
  INFLOW_BALANCE,
  SETTLE_OUT,
  INADVERTENT_OPENING,
  CONTROL_VALVE_BYPASS,
  BLOWBY_DISPLACEMENT,
  DISPLACEMENT,
  OVERFILLING,
  LOSS_OF_COOLING,
  AIR_COOLER_FAILURE,
  LOSS_OF_REFLUX,
  CLEAN_EXCHANGER,
  REACTION_HEAT,
  REACTION_TEMPERED,
  REACTION_GASSY,
  BLOCKED_IN_RISE,
  VACUUM_INFLOW,
  POOLED,
  ...LINE_METHODS,
  ACCUMULATION,
  SET_TOLERANCE,
  LETTERS,
  ISO_GAS,
  ISO_STEAM,
  ISO_LIQUID,
  ...DEVICE_METHODS,
  ...TANK_METHODS,
  ...PROPERTY_METHODS,
];
