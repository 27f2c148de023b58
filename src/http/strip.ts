/* What the strip of a page shows: the site, the person with their roles there, and their other sites. */
import { ROLE_WORDS } from '@domain/case';
import { type Actor } from '@services/context';

export type StripProps = {
  site: { id: string; name: string };
  otherSites: { id: string; name: string }[];
  person: { name: string; roles: string };
};

/** The strip's props of a page below /s/{site}. */
export function stripOf(locals: Pick<App.Locals, 'who'>, actor: Actor): StripProps {
  const { site, person, roles } = actor;
  const others = (locals.who?.sites ?? []).filter((one) => one.site.id !== site.id && one.roles.length > 0);
  return {
    site: { id: site.slug, name: site.name },
    otherSites: others.map((one) => ({ id: one.site.slug, name: one.site.name })),
    person: { name: person.name, roles: roles.map((role) => ROLE_WORDS[role]).join(', ') },
  };
}
