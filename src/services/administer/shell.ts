/* What the strip of a page says of who is signed in and where. */
import { ROLE_WORDS } from '@domain/case';
import { type Current } from '@auth/index';

export type Shell = {
  person: { name: string; roles: string };
  site?: { id: string; name: string };
  otherSites: { id: string; name: string }[];
};

/** Props of the page layout for a person at a site, or outside of any. */
export function shellOf(who: Current, slug?: string): Shell {
  const here = who.sites.find(({ site }) => site.slug === slug);
  const others = who.sites.filter((one) => one !== here);
  const roles = here ? here.roles.map((role) => ROLE_WORDS[role]).join(', ') : who.person.email;
  return {
    person: { name: who.person.name, roles },
    ...(here ? { site: { id: here.site.slug, name: here.site.name } } : {}),
    otherSites: others.map(({ site }) => ({ id: site.slug, name: site.name })),
  };
}
