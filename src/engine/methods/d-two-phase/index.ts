/* The two-phase and real-fluid methods, in the order of the catalogue. */
import { type Method } from '../../catalog/types';
import { OMEGA_SATURATED } from './saturated';
import { OMEGA_SUBCOOLED } from './subcooled';
import { ISENTROPE_TABLE } from './table';

/** Two-phase flow by omega, by integration along an isentrope, and both held against each other. */
export const TWO_PHASE_METHODS: readonly Method[] = [OMEGA_SATURATED, OMEGA_SUBCOOLED, ISENTROPE_TABLE];
