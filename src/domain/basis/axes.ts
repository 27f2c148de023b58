/* The eight axes that say what a relief device is; its names are derived from them. */
import { z } from 'zod';

export const axesSchema = z.strictObject({
  actuation: z.array(z.enum(['pressure', 'pilot', 'power', 'temperature'])).min(1),
  holds: z.enum(['spring', 'weight', 'supplementary', 'dome', 'element']),
  recloses: z.enum(['yes', 'disk', 'pin']),
  balance: z.enum(['none', 'bellows', 'piston']),
  action: z.enum(['pop', 'modulating', 'proportional']),
  lift: z.enum(['full', 'low', 'restricted']),
  direction: z.enum(['over', 'under', 'both']),
  certifiedFor: z.array(z.enum(['gas', 'steam', 'liquid'])),
});
export type Axes = z.infer<typeof axesSchema>;

export const PURPOSES = [
  'process',
  'supplementary-fire',
  'thermal',
  'breathing',
  'emergency-vent',
  'shields-a-valve',
] as const;
export const purposeSchema = z.enum(PURPOSES);
export type Purpose = z.infer<typeof purposeSchema>;
