/* Ids of converted elements: made from tags once, so that paths are the same on every machine and in every revision. */

/** `PSV-101A/in/1` → `psv101a_in_1`: lower case, what is not a letter or digit dropped, path parts joined by `_`. */
export function slug(tag: string): string {
  return tag
    .split('/')
    .map((part) => part.toLowerCase().replace(/[^a-z0-9]+/g, ''))
    .join('_');
}

/** An id of a kind: `idOf('rp', 'PSV-101A')` → `rp_psv101a`. */
export function idOf(prefix: string, ...tags: string[]): string {
  return [prefix, ...tags.map(slug)].join('_');
}

/** The id of the document of a system or header. */
export const documentId = (tag: string): string => idOf('doc', tag);
/** The id of a person of the invented site. */
export const personId = (demoId: string): string => idOf('per', demoId);
/** The id of a case of the invented site. */
export const caseId = (number: string): string => idOf('case', number);
/** The id of a unit of the invented site. */
export const unitId = (tag: string): string => idOf('unit', tag);
/** The id of a utility of the register. */
export const utilityId = (tag: string): string => idOf('util', tag);

/** Makes ids unique inside one list: the second `x` becomes `x_2`. */
export function uniqueIds(): (id: string) => string {
  const seen = new Map<string, number>();
  return (id) => {
    const times = (seen.get(id) ?? 0) + 1;
    seen.set(id, times);
    return times === 1 ? id : `${id}_${String(times)}`;
  };
}
