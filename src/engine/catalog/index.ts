/* The catalogue of methods: the engine's public face for sheets. */
import { type Inputs, type Worked } from '../sheet/types';
import { METHODS } from './methods';
import { type Method } from './types';

export { METHODS } from './methods';
export { type Method, type MethodInput, type MethodOutput } from './types';

/** The method with this id (with or without its `@version`), or undefined. */
export function methodById(id: string): Method | undefined {
  const [name, version] = id.split('@');
  return METHODS.find((m) => m.id === name && (version === undefined || String(m.version) === version));
}

/** Works a method's sheet. Never throws on bad input: an unknown method or a bad input is a refusal. */
export function workMethod(id: string, inputs: Inputs, edition?: string): Worked {
  const method = methodById(id);
  if (method) return method.work(inputs, edition);
  const text = `There is no method "${id}" in this version of the engine.`;
  return {
    method: id,
    steps: [],
    outputs: {},
    warnings: [],
    refused: { code: 'METHOD_UNKNOWN', text, field: 'method' },
  };
}
