/* What the signed-in person may do in a case, sorted for reading: now, once something is done, not as things are. */
import { type ActAnswer } from '@domain/case';
import { type CaseContext } from '@workflows/case';

export type OfferedAct = ActAnswer;
export type Sorted = { now: OfferedAct[]; later: OfferedAct[]; never: OfferedAct[]; notNow: OfferedAct[] };

/** Acts that every reader has and nobody looks up here. */
const SILENT: ReadonlySet<string> = new Set(['read', 'session', 'password', 'calculate', 'upload', 'attach']);

/** Sorts the acts of a case: possible, waiting for open points, refused for the person's own part in it, refused by the stage. */
export function sortActs(acts: readonly OfferedAct[]): Sorted {
  const shown = acts.filter(({ act }) => !SILENT.has(act));
  return {
    now: shown.filter((one) => one.ok),
    later: shown.filter(({ code }) => code === 'GATE_SHUT' || code === 'HIDDEN'),
    never: shown.filter(({ code }) => code === 'NOT_INDEPENDENT'),
    notNow: shown.filter(({ code }) => code === 'WRONG_STAGE'),
  };
}

/** Part of the case page on which an act is done; the brief is the empty one. */
const PARTS: Readonly<Record<string, string>> = {
  'edit-brief': '',
  nominate: '#people',
  'change-systems': '#systems',
  'answer-affected': '#affected',
  'replace-seat': '#people',
  'edit-document': '/changes',
  'edit-removal': '/changes',
  unseen: '/unseen',
  reveal: '/unseen',
  reconcile: '/unseen',
  agree: '/sheets',
  'undo-agreement': '/sheets',
  'agree-removal': '/sheets',
  'raise-finding': '/findings',
  'answer-finding': '/findings',
  'close-finding': '/findings',
  'reopen-finding': '/findings',
  SIGN: '/summary',
  REFUSE: '/summary',
  require: '/summary',
  'confirm-approval': '/summary',
  'enter-field': '/field',
  fix: '/field',
  'see-again': '/field',
  'send-back': '/field',
  ISSUE: '/field',
  DROP: '/field',
  REMOVE: '/field',
};

/** Where an act is done: the page's own answer first, else the part of the case that holds its form. */
export function linkOf(act: string, base: string, links: Readonly<Record<string, string>> = {}): string {
  return links[act] ?? `${base}${PARTS[act] ?? '/signatures'}`;
}

/** "send it to the check" → "Send it to the check". */
export function sentenceCase(words: string): string {
  return words.charAt(0).toUpperCase() + words.slice(1);
}

export type MachineProps = {
  stage: string;
  context: CaseContext;
  actor: { id: string; roles: readonly string[]; seats: readonly string[] };
  open: readonly { code: string; sentence: string; where: string }[];
};
