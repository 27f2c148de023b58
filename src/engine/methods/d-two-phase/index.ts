/* The two-phase and real-fluid methods, in the order of the catalogue. */
import { type Method } from '../../catalog/types';
import { COMPARISON } from './comparison';
import { HEM_NOZZLE, HEM_SIZE } from './hem-nozzle';
import { REAL_GAS_NOZZLE, REAL_GAS_SIZE } from './real-gas';
import { OMEGA_SATURATED } from './saturated';
import { OMEGA_SUBCOOLED } from './subcooled';
import { ISENTROPE_TABLE } from './table';

/** Two-phase flow by omega, by integration along an isentrope, and both held against each other. */
export const TWO_PHASE_METHODS: readonly Method[] = [
  OMEGA_SATURATED,
  OMEGA_SUBCOOLED,
  ISENTROPE_TABLE,
  HEM_NOZZLE,
  HEM_SIZE,
  REAL_GAS_NOZZLE,
  REAL_GAS_SIZE,
  COMPARISON,
];
