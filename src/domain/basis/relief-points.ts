/* Relief points: the place on the nozzle with everything that is required of what sits there. */
import { z } from 'zod';
import { axesSchema, purposeSchema } from './axes';
import {
  bonnetSchema,
  diskSchema,
  partSchema,
  pilotSchema,
  powerSchema,
  withDiskSchema,
} from './device-parts';
import { say } from './fields';
import { figure, idSchema, lineSchema, maybe, ptSchema, tagSchema, wordSchema } from './figures';

export const connectionSchema = z.strictObject({
  nominal: say('nominal size', wordSchema.optional()),
  bore: maybe('nominalSize'),
  rating: ptSchema.optional(),
  facing: wordSchema.optional(),
});
export type Connection = z.infer<typeof connectionSchema>;

const orificeSchema = z.strictObject({
  letter: say('orifice letter', z.string().max(4).optional()),
  effective: say('effective area', maybe('orificeArea')),
  actual: say('actual area', maybe('orificeArea')),
  vacuum: say('area for vacuum', maybe('orificeArea')),
  lift: maybe('lift'),
  fullLift: say('full lift', maybe('lift')),
  restrictedBy: say('lift restricted by', z.enum(['maker', 'authorised-shop', 'other']).optional()),
  restrictionOnPlate: z.boolean().optional(),
});

const coefficientsSchema = z.strictObject({
  gas: say('certified coefficient of discharge, gas', maybe('kdGas')),
  liquid: say('certified coefficient of discharge, liquid', maybe('kdLiquid')),
  kb: say('Kb', maybe('kb')),
  kw: say('Kw', maybe('kw')),
  kc: say('combination factor Kc', maybe('kc')),
  note: lineSchema.optional(),
});

const limitsSchema = z.strictObject({
  back: say('limit of back pressure', maybe('backPressureLimit')),
  bellows: say('limit of the bellows', ptSchema.optional()),
  outletBody: say('rating of the outlet body', ptSchema.optional()),
});

const settings = {
  overpressure: maybe('overpressure'),
  blowdown: maybe('blowdown'),
  set: say('set pressure', maybe('setPressure')),
  setVacuum: say('set vacuum', maybe('setPressureVacuum')),
  fullFlow: say('pressure of full flow', maybe('setPressure')),
  fullFlowVacuum: say('vacuum of full flow', maybe('setPressureVacuum')),
  cdtp: say('cold differential test pressure (CDTP)', maybe('cdtp')),
  tolerance: say('tolerance of set', z.enum(['standard', 'minus-0-plus-10']).optional()),
  temperatureFactor: say('temperature factor of the CDTP', maybe('cdtpRatio')),
  spring: say(
    'spring range',
    z
      .strictObject({
        lo: say('spring range from', figure('setPressure')),
        hi: say('spring range to', figure('setPressure')),
        number: wordSchema.optional(),
      })
      .optional(),
  ),
  superimposed: say(
    'superimposed back pressure',
    z
      .strictObject({
        min: say('least superimposed back pressure', maybe('superimposed')),
        max: say('greatest superimposed back pressure', maybe('superimposed')),
      })
      .optional(),
  ),
};

const construction = {
  limits: limitsSchema.optional(),
  seat: z.enum(['metal', 'soft']).optional(),
  softGoods: z
    .strictObject({
      min: say('lowest temperature of the soft goods', figure('mdmt')),
      max: say('highest temperature of the soft goods', figure('designTemperature')),
    })
    .optional(),
  trim: wordSchema.optional(),
  sour: say('sour service', z.enum(['stated', 'not-stated']).optional()),
  standOff: z.boolean().optional(),
  parts: say('parts', z.array(partSchema).optional()),
  bonnet: bonnetSchema.optional(),
  pilot: pilotSchema.optional(),
  power: powerSchema.optional(),
  thermal: say(
    'thermal element',
    z
      .strictObject({
        opensAt: say('opens at', figure('operatingTemperature')),
        fullAt: say('fully open at', figure('operatingTemperature')),
        note: lineSchema.optional(),
      })
      .optional(),
  ),
  disk: say('rupture disk', diskSchema.optional()),
  with: say('in combination with a disk', withDiskSchema.optional()),
};

export const reliefPointSchema = z.strictObject({
  id: idSchema,
  tag: tagSchema,
  name: wordSchema.optional(),
  on: say(
    'place',
    z
      .strictObject({
        equipment: idSchema,
        side: idSchema.optional(),
        nozzle: wordSchema.optional(),
        elevation: maybe('elevation'),
      })
      .optional(),
  ),
  axes: say('kind of device', axesSchema),
  service: z.enum(['in-service', 'spare', 'out-of-service']),
  duty: z.enum(['gas', 'steam', 'liquid', 'mixed']),
  maker: wordSchema.optional(),
  model: wordSchema.optional(),
  inlet: connectionSchema.optional(),
  outlet: connectionSchema.optional(),
  purpose: purposeSchema,
  orifice: orificeSchema,
  k: say('coefficients', coefficientsSchema.optional()),
  capacity: say(
    'certified capacity',
    z
      .strictObject({
        of: say('certified capacity', figure('capacity')),
        medium: z.enum(['air', 'steam', 'water']),
        over: say('overpressure of the certified capacity', maybe('overpressure')),
      })
      .optional(),
  ),
  ...settings,
  ...construction,
  times: z
    .strictObject({
      opens: say('opening time', maybe('openingTime')),
      closes: say('closing time', maybe('openingTime')),
      frequency: say('natural frequency', maybe('frequency')),
    })
    .optional(),
  mark: z
    .strictObject({
      code: wordSchema.optional(),
      certificate: wordSchema.optional(),
      category: wordSchema.optional(),
    })
    .optional(),
  test: z
    .strictObject({ interval: say('test interval', maybe('testInterval')), shop: wordSchema.optional() })
    .optional(),
  equals: say(
    'accepted as equal',
    z
      .array(z.strictObject({ id: idSchema, maker: wordSchema, model: wordSchema, signature: idSchema }))
      .optional(),
  ),
});
export type ReliefPoint = z.infer<typeof reliefPointSchema>;
