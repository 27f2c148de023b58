/* The list of every method, in the order of the reference topics. */
import { type Method } from './types';

/** All methods of the engine. */
export const METHODS: readonly Method[] = [];
