/* Equipment that is protected, with the sides that hold pressure. */
import { z } from 'zod';
import { richSchema } from '@domain/text/schema';
import { say } from './fields';
import {
  codeSchema,
  figure,
  idSchema,
  inputSchema,
  lineSchema,
  maybe,
  originSchema,
  tagSchema,
  wordSchema,
} from './figures';

export const EQUIPMENT_KINDS = [
  'vessel',
  'column',
  'drum',
  'reactor',
  'exchanger',
  'fired-heater',
  'boiler',
  'filter',
  'pump',
  'compressor',
  'storage-tank',
  'piping',
] as const;

export const sideSchema = z.strictObject({
  id: idSchema,
  name: wordSchema,
  holds: say('protected', z.enum(['here', 'elsewhere', 'pressureless'])),
  system: say('protected by system', idSchema.optional()),
  medium: wordSchema.optional(),
  code: say('code basis', codeSchema.optional()),
  material: wordSchema.optional(),
  ratings: say(
    'MAWP and design temperature',
    z.array(
      z.strictObject({
        id: idSchema,
        mawp: say('MAWP', figure('mawp', 'tankDesignPressure')),
        at: say('design temperature', maybe('designTemperature')),
      }),
    ),
  ),
  mdmt: say('minimum design metal temperature', maybe('mdmt')),
  designVacuum: say('design vacuum', maybe('designVacuum')),
  external: say(
    'external pressure rating',
    z.union([figure('externalRating'), z.enum(['full-vacuum', 'none'])]).optional(),
  ),
  test: say('test pressure', maybe('testPressure')),
  stressRatio: say('stress ratio of the test', maybe('stressRatio')),
  pipingTest: say('test pressure of the connected piping', maybe('testPressure')),
  pulsating: z.boolean().optional(),
  operating: say(
    'operating conditions',
    z
      .strictObject({
        normal: say('normal operating pressure', maybe('operatingPressure')),
        max: say('maximum operating pressure', maybe('operatingPressure')),
        temperature: say('operating temperature', maybe('operatingTemperature')),
      })
      .optional(),
  ),
});
export type Side = z.infer<typeof sideSchema>;

const shapeSchema = z.strictObject({
  orientation: z.enum(['vertical', 'horizontal', 'sphere']).optional(),
  diameter: maybe('vesselDiameter'),
  length: say('length, tangent to tangent', maybe('vesselLength')),
  wall: say('wall thickness', maybe('wall')),
  roof: wordSchema.optional(),
  heads: z.enum(['ellipsoidal', 'hemispherical', 'dished', 'conical', 'flat']).optional(),
  tubes: z
    .strictObject({
      count: say('number of tubes', z.number().int().positive().max(100_000).optional()),
      bore: say('tube bore', maybe('tubeBore')),
      length: say('tube length', maybe('tubeLength')),
    })
    .optional(),
});

const levelsSchema = z.strictObject({
  normal: say('normal level', maybe('liquidLevel')),
  high: say('high level', maybe('liquidLevel')),
  fire: say('level in fire', maybe('liquidLevel')),
  fireBasis: say(
    'basis of the level in fire',
    z.enum(['full', 'normal-maximum', 'bottoms-and-trays', 'storage-maximum']).optional(),
  ),
});

const insulationSchema = z.strictObject({
  material: wordSchema,
  thickness: say('insulation thickness', maybe('insulationThickness')),
  conductivity: say('conductivity of the insulation', maybe('insulationConductivity')),
  fireCredit: say('credit in fire', z.boolean()),
  intactHot: say('stays intact in fire', z.boolean().optional()),
  hoseStream: say('withstands a hose stream', z.boolean().optional()),
  banded: say('banded in steel', z.boolean().optional()),
  ref: say('reference', wordSchema.optional()),
});

const fireSchema = z.strictObject({
  zone: say('fire zone', idSchema.optional()),
  base: say('level a fire can stand on', maybe('elevation')),
  skirtClosed: z.boolean().optional(),
  drainage: say('drainage away from the vessel', z.boolean().optional()),
  drainageRef: say('reference of the drainage', wordSchema.optional()),
  otherCredit: z.enum(['water-spray', 'depressuring']).optional(),
  wallTemperature: maybe('wallTemperature'),
  ruptureStress: maybe('stress'),
});

const blockedInSchema = z.strictObject({
  liquidFull: z.boolean(),
  endsClose: say('both ends can be shut', z.boolean()),
  heat: say('source of heat', z.enum(['none', 'sun', 'tracing', 'hot-side', 'ambient'])),
  rise: say('temperature rise', maybe('temperatureRise')),
  modulus: say('modulus of elasticity', maybe('modulus')),
  metalExpansion: say('expansion of the metal', maybe('metalExpansion')),
  poisson: say('Poisson ratio', maybe('poisson')),
  fill: say('pressure when shut in', maybe('operatingPressure')),
  exempt: say('why exempt', lineSchema.optional()),
});

const noDeviceSchema = z.strictObject({
  reason: z.enum(['system-design', 'cannot-exceed', 'other']),
  text: richSchema,
  sourceMax: say('greatest pressure of the sources', inputSchema.optional()),
  analysis: idSchema.optional(),
  acceptedBy: idSchema.optional(),
});

export const equipmentSchema = z.strictObject({
  id: idSchema,
  tag: tagSchema,
  name: wordSchema.optional(),
  origin: originSchema.optional(),
  sides: z.array(sideSchema),
  contents: wordSchema.optional(),
  volume: maybe('volume'),
  inventory: maybe('inventory'),
  kind: z.enum(EQUIPMENT_KINDS),
  shape: shapeSchema.optional(),
  elevation: maybe('elevation'),
  levels: say('liquid levels', levelsSchema.optional()),
  insulation: insulationSchema.optional(),
  fire: say('fire', fireSchema.optional()),
  storage: z
    .strictObject({
      liquefied: z.boolean(),
      refrigerated: z.boolean(),
      permanentSupply: say('device on a permanent supply', z.boolean()),
    })
    .optional(),
  blockedIn: say('blocked in', blockedInSchema.optional()),
  noDevice: say('no device of its own', noDeviceSchema.optional()),
});
export type Equipment = z.infer<typeof equipmentSchema>;
