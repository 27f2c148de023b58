/* The methods on properties of fluids. */
import { type Method } from '../../catalog/types';
import { BOILING_CURVE } from './boiling-curve';
import { FLUID_PROPERTIES } from './fluid-properties';
import { LATENT_HEAT } from './latent-heat';

/** Properties at a state, latent heat, and the boiling curve of a mixture. */
export const PROPERTY_METHODS: readonly Method[] = [FLUID_PROPERTIES, LATENT_HEAT, BOILING_CURVE];
