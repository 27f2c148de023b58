/* The findings of a case as threads, with what the reader may do to each; what others wrote stands without figures while hidden. */
import { type FindingWeight } from '@domain/case';
import { plainText, richFromText } from '@domain/text';
import { instantWords } from './when';
import { type May, mayHere, nameOf } from './acts';
import { type OpenedCase } from './open';
import { type Place, type PlaceChoice, placeChoices, placeOf } from './places';
import { type Prose, proseOf } from './prose';

export type FindingView = {
  number: number;
  weight: FindingWeight;
  state: 'open' | 'answered' | 'closed';
  place: Place;
  since: string;
  posts: { by: string; at: string; text: Prose; change?: Place }[];
  /** The acts that fit the thread as it stands. */
  answer?: May;
  close?: May;
  reopen?: May;
};
export type FindingsView = {
  findings: FindingView[];
  counts: { open: number; answered: number; closed: number; mustFix: number };
  raise: May;
  places: PlaceChoice[];
  /** Places of changes that an answer can point to. */
  changes: PlaceChoice[];
};

function sinceOf(of: OpenedCase, finding: OpenedCase['file']['findings'][number]): string {
  const zone = of.file.site.timeZone;
  const last = finding.posts.at(-1);
  if (finding.state === 'open') return `open since ${instantWords(finding.raisedAt, zone)}`;
  const at = instantWords(last?.at ?? finding.raisedAt, zone);
  if (finding.state === 'closed') return `closed ${at}`;
  const waits = nameOf(of, finding.successorId ?? finding.raisedBy);
  return `answered ${at}, waits for ${finding.raisedBy === of.actor.person.id ? 'you' : waits}`;
}

/** One's own words as they were written: its live figures stay as affirmed and do not follow what is hidden. */
function ownWords(text: Prose['rich']): Prose {
  return { rich: richFromText(plainText(text)), figures: [] };
}

function findingView(of: OpenedCase, finding: OpenedCase['file']['findings'][number]): FindingView {
  const facts = {
    raisedBy: finding.raisedBy,
    ...(finding.successorId ? { successor: finding.successorId } : {}),
  };
  const document = of.file.documents.find((one) => finding.place.startsWith(`${one.document.id}:`));
  const own = of.actor.person.id;
  return {
    number: finding.number,
    weight: finding.weight,
    state: finding.state,
    place: placeOf(of, finding.place),
    since: sinceOf(of, finding),
    posts: finding.posts.map((post) => ({
      by: nameOf(of, post.byId),
      at: instantWords(post.at, of.file.site.timeZone),
      text:
        of.hidden && post.byId === own
          ? ownWords(post.text as Prose['rich'])
          : proseOf(of, post.text as Prose['rich'], document),
      ...(post.changePath === null ? {} : { change: placeOf(of, post.changePath) }),
    })),
    ...(finding.state === 'open' ? { answer: mayHere(of, 'answer-finding') } : {}),
    ...(finding.state === 'answered' ? { close: mayHere(of, 'close-finding', facts) } : {}),
    ...(finding.state === 'open' ? {} : { reopen: mayHere(of, 'reopen-finding', facts) }),
  };
}

/** Every finding of the case: open ones first, closed ones last. */
export function findingsView(of: OpenedCase): FindingsView {
  const rows = of.file.findings;
  const count = (state: string) => rows.filter((one) => one.state === state).length;
  const order = { open: 0, answered: 1, closed: 2 };
  const places = placeChoices(of);
  return {
    findings: rows
      .toSorted((a, b) => order[a.state] - order[b.state] || a.number - b.number)
      .map((one) => findingView(of, one)),
    counts: {
      open: count('open'),
      answered: count('answered'),
      closed: count('closed'),
      mustFix: rows.filter((one) => one.weight === 'must-fix' && one.state !== 'closed').length,
    },
    raise: mayHere(of, 'raise-finding'),
    places,
    changes: places.filter((one) => !one.value.includes(':sheets/')),
  };
}
