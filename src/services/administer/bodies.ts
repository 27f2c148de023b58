/* What requests about people and accounts send: the shape, and a sentence for each thing that is wrong. */
import { z } from 'zod';
import { ROLES } from '@domain/case';

/** A text of a form: missing counts as empty, so that one sentence says what is asked. */
const asked = (sentence: string, most = 120) =>
  z.string({ error: sentence }).trim().min(1, sentence).max(most, `Keep this to ${most} characters.`);

const email = z
  .string({ error: 'Give the e-mail address.' })
  .trim()
  .max(254, 'An e-mail address has at most 254 characters.')
  .regex(/^[^\s@<>",]+@[^\s@<>",]+$/, 'An e-mail address looks like name@example.org.');
const password = z.string({ error: 'Give a password.' }).max(1_000, 'The password is too long.');
const again = z.string({ error: 'Type the new password a second time.' }).max(1_000);
const name = asked('Give the name as it stands under a signature.');
const job = asked('Give the job, or leave it out.').nullable();
const phone = asked('Give the telephone number, or leave it out.', 40).nullable();
const deputy = asked('Name a person, or leave it out.', 60).nullable();
const ONE_ROLE = 'Give at least one role: without one a person sees nothing of the site.';
const roles = z
  .array(z.enum(ROLES, { error: `A role is one of ${ROLES.join(', ')}.` }), {
    error: ({ input }) => (input === undefined ? ONE_ROLE : 'Send the roles as a list.'),
  })
  .max(ROLES.length);

const SAME = 'The two new passwords are not the same.';
const alike = (body: { password: string; again?: string | undefined }): boolean =>
  body.again === undefined || body.again === body.password;
const atAgain = { path: ['again'], error: SAME };

export const signInSchema = z.strictObject({
  email: z.string({ error: 'Give your e-mail address.' }).max(320),
  password: z.string({ error: 'Give your password.' }).max(1_000),
});

export const passwordSchema = z
  .strictObject({
    current: z.string({ error: 'Give your present password.' }).max(1_000),
    password,
    again: again.optional(),
    /** Only there for password managers. */
    username: z.string().optional(),
  })
  .refine(alike, atAgain);

export const inviteSchema = z
  .strictObject({ token: z.string().max(200), password, again: again.optional() })
  .refine(alike, atAgain);

export const themeSchema = z.strictObject({
  theme: z.enum(['light', 'dark', 'system'], { error: 'A ground is light, dark or system.' }),
});

export const addPersonSchema = z.strictObject({
  name,
  email,
  job: job.default(null),
  phone: phone.default(null),
  deputy: deputy.default(null),
  roles: roles.min(1, ONE_ROLE),
});
export type AddPerson = z.output<typeof addPersonSchema>;

/** Some of a person's fields; what is left out stays. */
export const changePersonSchema = z.strictObject({ name, job, phone, deputy }).partial();
/** All of a person's fields; what is left out is emptied. */
export const wholePersonSchema = z.strictObject({
  name,
  job: job.default(null),
  phone: phone.default(null),
  deputy: deputy.default(null),
});
export type ChangePerson = z.output<typeof changePersonSchema>;

/** All roles that a person is to have at the site from now on. */
export const rolesSchema = z.strictObject({ roles: roles.default([]) });
export type SetRoles = z.output<typeof rolesSchema>;

/** An act that needs no more than the person it is about. */
export const nothingSchema = z.strictObject({});

export const firstSiteSchema = z.strictObject({
  site: asked('Give the name of the site.', 80),
  slug: z
    .string({ error: 'Give the name in addresses.' })
    .trim()
    .regex(/^[a-z][a-z0-9-]{1,38}[a-z0-9]$/, 'Small letters, digits and hyphens, 3 to 40, a letter first.'),
  letters: z
    .string({ error: 'Give the letters of case numbers.' })
    .trim()
    .regex(/^[A-Z]{2,4}$/, 'Two to four capital letters, as KW in KW-2026-003.'),
  zone: z
    .string({ error: 'Choose the time zone.' })
    .refine(isTimeZone, 'This is not a time zone; one is named like Europe/Vienna.'),
  barometer: z.strictObject(
    {
      value: z.string({ error: 'Give the mean barometric pressure of the site.' }).trim().max(30),
      unit: z.string({ error: 'Choose the unit.' }).max(12),
    },
    { error: 'Give the mean barometric pressure of the site.' },
  ),
  name,
  email,
  password,
});
export type FirstSite = z.output<typeof firstSiteSchema>;

/** True for a zone that this machine knows. */
export function isTimeZone(zone: string): boolean {
  try {
    return new Intl.DateTimeFormat('en', { timeZone: zone }).resolvedOptions().timeZone !== '';
  } catch {
    return false;
  }
}
