/* The methods on inlet and outlet lines, in the order of the reference topics. */
import { ACOUSTIC_FATIGUE } from './acoustic-fatigue';
import { FITTING_LOSSES } from './fitting-losses';
import { INLET_LOSS } from './inlet-loss';
import { INLET_STABILITY } from './inlet-stability';
import { NOISE } from './noise';
import { OUTLET_FANNO } from './outlet-fanno';
import { OUTLET_HOMOGENEOUS } from './outlet-homogeneous';
import { OUTLET_ISOTHERMAL } from './outlet-isothermal';
import { OUTLET_LIQUID } from './outlet-liquid';
import { PIPE_DISCHARGE } from './pipe-discharge';
import { REACTION_CLOSED } from './reaction-closed';
import { REACTION_FORCE } from './reaction-force';
import { CRITICAL_FLOW, FANNO_FUNCTION, SONIC_VELOCITY } from './small';

/** Methods on lines. */
export const LINE_METHODS = [
  CRITICAL_FLOW,
  FANNO_FUNCTION,
  SONIC_VELOCITY,
  FITTING_LOSSES,
  INLET_LOSS,
  INLET_STABILITY,
  OUTLET_ISOTHERMAL,
  OUTLET_FANNO,
  OUTLET_LIQUID,
  OUTLET_HOMOGENEOUS,
  PIPE_DISCHARGE,
  REACTION_FORCE,
  REACTION_CLOSED,
  NOISE,
  ACOUSTIC_FATIGUE,
];
