/* What a sheet is called on pages and in sentences. */
import { type Basis } from '@domain/basis';
import { scenarioLabel, scenarioOfKey } from './read';

/** What each kind of sheet works, by the first part of its key. */
export const SHEET_KINDS: Readonly<Record<string, string>> = {
  limit: 'Allowed and relieving pressure',
  load: 'Relief load',
  size: 'Required area',
  rated: 'Rated capacity',
  inlet: 'Inlet pressure loss',
  outlet: 'Back pressure',
  cold: 'Cold differential test pressure',
  force: 'Reaction force',
  noise: 'Noise',
  opening: 'Opening of the group',
  header: 'Header',
};

/** What tells two sheets of one relief point apart: the vacuum side, or who else relieves through the outlet. */
function sideOf(kind: string, part: string | undefined): string {
  if (part === 'vacuum') return ' under vacuum';
  if (kind !== 'outlet' || part === undefined) return '';
  return part === 'own' ? ' of its own relief' : ' in a common cause';
}

/**
 * The name of a sheet: what it works, and for which scenario or relief point.
 * @example sheetLabel(basis, 'size:cooling-water-loss/ans_g1') → "Required area, Loss of cooling water"
 */
export function sheetLabel(doc: Basis, key: string): string {
  const at = key.indexOf(':');
  const [kind, rest] = [key.slice(0, at), key.slice(at + 1)];
  const [id = '', answerId] = rest.split('/');
  const words = SHEET_KINDS[kind] ?? kind;
  const scenario = ['limit', 'load', 'size'].includes(kind) ? scenarioOfKey(doc, key) : undefined;
  if (scenario) {
    const answer = scenario.answers.find((one) => one.id === answerId)?.name;
    return [words, scenarioLabel(doc, scenario), answer].filter((part) => part !== undefined).join(', ');
  }
  const about =
    doc.reliefPoints.find((one) => one.id === id)?.tag ?? doc.groups.find((one) => one.id === id)?.name;
  const side = sideOf(kind, answerId);
  return about === undefined ? `${words}${side}` : `${words}${side}, ${about}`;
}
