/* Fluids: a named state at relieving conditions, each figure with its origin. */
import { z } from 'zod';
import { say } from './fields';
import { figure, idSchema, lineSchema, maybe, wordSchema } from './figures';

const fromSchema = z.strictObject({
  kind: z.enum(['own', 'substance', 'water', 'composition']),
  substance: wordSchema.optional(),
  parts: z
    .array(z.strictObject({ id: idSchema, substance: wordSchema, amount: figure('fraction') }))
    .optional(),
  per: z.enum(['mole', 'mass']).optional(),
  method: wordSchema.optional(),
  file: idSchema.optional(),
  saturatedAt: maybe('sourcePressure'),
});

const hazardsSchema = z.strictObject({
  toxic: z.boolean().optional(),
  flammable: z.boolean().optional(),
  liquefied: z.boolean().optional(),
  solids: z.boolean().optional(),
  wax: z.boolean().optional(),
  polymer: z.boolean().optional(),
  hydrate: z.boolean().optional(),
  freezing: z.boolean().optional(),
  h2s: say('partial pressure of hydrogen sulphide', maybe('h2sPartialPressure')),
});

export const fluidSchema = z.strictObject({
  id: idSchema,
  name: wordSchema,
  note: lineSchema.optional(),
  phase: z.enum(['gas', 'vapour', 'liquid', 'flashing-liquid', 'two-phase', 'supercritical']),
  from: say('where the properties come from', fromSchema),
  P: say('pressure', maybe('sourcePressure')),
  T: say('temperature', maybe('relievingTemperature')),
  M: say('molar mass', maybe('molarMass')),
  Z: say('compressibility factor Z', maybe('z')),
  k: say('ratio of specific heats k', maybe('kIdeal')),
  kIs: say('which k it is', z.enum(['ideal', 'real', 'not-said']).optional()),
  n: say('isentropic exponent', maybe('isentropicExponent')),
  latentHeat: maybe('latentHeat'),
  cpLiquid: say('heat capacity of the liquid', maybe('cpLiquid')),
  rhoVapour: say('vapour density', maybe('gasDensity')),
  rhoLiquid: say('liquid density', maybe('liquidDensity')),
  relativeDensity: maybe('relativeDensity'),
  muVapour: say('vapour viscosity', maybe('viscosityGas')),
  muLiquid: say('liquid viscosity', maybe('viscosityLiquid')),
  expansion: say('cubic expansion', maybe('cubicExpansion')),
  compressibility: say('liquid compressibility', maybe('liquidCompressibility')),
  psat: say(
    'vapour pressure',
    z
      .array(
        z.strictObject({
          id: idSchema,
          at: say('temperature', maybe('relievingTemperature')),
          p: say('vapour pressure', figure('vapourPressure')),
        }),
      )
      .optional(),
  ),
  Tc: say('critical temperature', maybe('criticalTemperature')),
  Pc: say('critical pressure', maybe('criticalPressure')),
  quality: say('vapour quality', maybe('quality')),
  omega: say('omega parameter', maybe('omega')),
  v0: say('specific volume at the inlet', maybe('specificVolume')),
  v9: say('specific volume at 90 % of the inlet pressure', maybe('specificVolume')),
  sound: say('speed of sound', maybe('soundSpeed')),
  boilingRange: maybe('temperatureRise'),
  lightGas: say('fraction of light gas', maybe('fraction')),
  freezes: say('freezing point', maybe('freezingPoint')),
  dewPoint: maybe('relievingTemperature'),
  foamy: z.enum(['yes', 'no']).optional(),
  hazards: hazardsSchema.optional(),
});
export type Fluid = z.infer<typeof fluidSchema>;
