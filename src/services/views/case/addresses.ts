/* Addresses of places of a case: the part of a page that holds what a link names stands in the address, so that the page shows it. */
import { type CaseFile } from '../../case-file';

/** The sections of what changes, as `part` names them; inputs of loads and sizes stand below their scenario. */
export function sectionOf(path: string): string {
  const list = path.split('/')[0] ?? '';
  return list === 'scenarios' ? 'loads' : list;
}

/** The address at which a figure of a system is changed. */
export function changeHref(base: string, system: string, path: string): string {
  const query = `?system=${encodeURIComponent(system)}&part=${sectionOf(path)}`;
  return `${base}/changes${query}#${encodeURIComponent(path)}`;
}

/** The address of a place that a gate's open point names; lines are shown on the page of their system. */
export function addressOf(file: Pick<CaseFile, 'site' | 'row' | 'documents'>, where: string): string {
  const site = `/s/${file.site.slug}`;
  const [, part = '', query = '', anchor = ''] =
    /^cases\/[^/]+\/(changes|lines)(?:\?system=([^#]*))?(?:#(.*))?$/.exec(where) ?? [];
  const system = query === '' ? (file.documents[0]?.document.tag ?? '') : decodeURIComponent(query);
  if (part === 'lines') return `${site}/systems/${encodeURIComponent(system)}/lines#${anchor}`;
  if (part === 'changes' && anchor !== '')
    return changeHref(`${site}/cases/${file.row.number}`, system, decodeURIComponent(anchor));
  return `${site}/${where}`;
}
