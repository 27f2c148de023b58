/* What a signature means, what it binds, and whether it still binds what stands now. */
import { hashOf } from '@domain/basis';
import { type FieldFacts } from '@domain/field';
import { type Brief } from './brief';
import { type BoundPart, type Finding, type Hash, type Id, type Signature, type UnseenEntry } from './types';

/** What the signer says, by gate; stands beside name, time and zone wherever the signature is shown. */
export const MEANINGS = {
  draft: 'I have described this change and all that I know it may affect.',
  scenarios: 'I have analysed every scenario, and the figures and reasons are mine.',
  check: 'I have worked the governing sheets unseen, looked at every changed sheet, and stand by the check.',
  approval:
    'I have read the summary, accept what is justified and inherited in it, and approve this change for installation.',
  grade: 'I accept this relief basis for its grade, and no further.',
  field: 'I have seen what is installed, it is what was signed, and operations accept it for start-up.',
  authorisation: 'I authorise this emergency change; its analysis and check follow by the days given.',
  'confirm-approval': 'I have looked at this approval again, and it still holds.',
  extension: 'I accept that this temporary change lasts until the new day.',
  deficiency: 'I know of this deficiency, accept its interim measure, and hold its owner to the day.',
  removal: 'I have seen that the temporary change is undone and nothing else with it.',
  'in-kind': 'I have compared attribute by attribute: this is a replacement in kind.',
  rules: 'I have read what this change of the site rules frees and tightens.',
} as const;
export type SignedGate = keyof typeof MEANINGS;

/** The meaning that goes with a gate. */
export function meaningOf(gate: SignedGate): string {
  return MEANINGS[gate];
}

export type BindFacts = {
  case: Id;
  brief: Brief;
  rules: { id: Id; judgementHash: Hash };
  documents: readonly { document: Id; documentHash: Hash; importsHash: Hash; sheetHashes: readonly Hash[] }[];
  unseen: readonly UnseenEntry[];
  findings: readonly Finding[];
  field: FieldFacts;
};
export type Narrow = { document?: Id; findings?: number };

const PARTS: Record<SignedGate, readonly BoundPart['part'][]> = {
  draft: ['brief'],
  scenarios: ['brief', 'document', 'imports', 'rules', 'evaluation'],
  check: ['brief', 'document', 'imports', 'rules', 'evaluation', 'unseen', 'findings'],
  approval: ['brief', 'document', 'imports', 'rules', 'evaluation', 'unseen', 'findings'],
  grade: ['brief', 'document', 'imports', 'rules'],
  field: ['document', 'imports', 'rules', 'evaluation', 'field-sheet'],
  authorisation: ['brief'],
  'confirm-approval': ['document', 'imports', 'rules', 'evaluation'],
  extension: ['brief'],
  deficiency: [],
  removal: ['document', 'imports', 'rules', 'evaluation', 'field-sheet'],
  'in-kind': [],
  rules: ['rules'],
};

/** Hash of a brief; the progress of its papers is left out, for it moves on after the signature. */
export function briefHash(brief: Brief): Hash {
  const papers = brief.papers.map(({ state: _state, ...paper }) => paper);
  return hashOf('brief', { ...brief, papers });
}

/** Hash of an evaluation as a signature binds it: its sheets by method and inputs, in sorted order. */
export function sheetsHash(hashes: readonly Hash[]): Hash {
  return hashOf('sheets', [...hashes].sort());
}

/** Findings as they stood when there were `count` of them; only of must-fix ones does the state matter. */
function findingsHash(findings: readonly Finding[], count: number): Hash {
  const first = findings.filter((each) => each.number <= count).sort((a, b) => a.number - b.number);
  const lines = first.map(({ number, weight, place, state }) => ({
    number,
    weight,
    place,
    state: weight === 'must-fix' ? state : null,
  }));
  return hashOf('findings', lines);
}

function fieldHash(field: FieldFacts, document: Id): Hash {
  const lines = field.lines.filter((line) => line.document === document);
  const keys = new Set(lines.map((line) => line.key));
  const entries = field.entries.filter((entry) => keys.has(entry.line));
  const ids = new Set(entries.map((entry) => entry.id));
  const discrepancies = field.discrepancies
    .filter((each) => ids.has(each.entry))
    .map(({ number, state }) => ({ number, state }));
  return hashOf('field-sheet', {
    lines,
    entries: entries.map(({ shownAt: _shown, ...entry }) => entry),
    discrepancies,
  });
}

/**
 * The parts that a signature of this gate binds, with their present hashes. `narrow.document` limits it to one system
 * (gates of the field and of removal); `narrow.findings` takes the findings as they were when there were so many.
 */
export function boundParts(gate: SignedGate, facts: BindFacts, narrow: Narrow = {}): BoundPart[] {
  const documents = facts.documents.filter((each) => !narrow.document || each.document === narrow.document);
  const count = narrow.findings ?? facts.findings.length;
  const unseen = facts.unseen.map(({ id, scope, round, value, word, reconciled }) => ({
    id,
    scope,
    round,
    value,
    word,
    reconciled,
  }));
  const of: Record<BoundPart['part'], () => BoundPart[]> = {
    brief: () => [{ part: 'brief', of: facts.case, hash: briefHash(facts.brief) }],
    document: () =>
      documents.map((each) => ({ part: 'document', of: each.document, hash: each.documentHash })),
    imports: () => documents.map((each) => ({ part: 'imports', of: each.document, hash: each.importsHash })),
    evaluation: () =>
      documents.map((each) => ({
        part: 'evaluation',
        of: each.document,
        hash: sheetsHash(each.sheetHashes),
      })),
    rules: () => [{ part: 'rules', of: facts.rules.id, hash: facts.rules.judgementHash }],
    unseen: () => [{ part: 'unseen', of: facts.case, hash: hashOf('unseen', unseen) }],
    findings: () => [
      { part: 'findings', of: `${facts.case}:${String(count)}`, hash: findingsHash(facts.findings, count) },
    ],
    'field-sheet': () =>
      documents.map((each) => ({
        part: 'field-sheet',
        of: each.document,
        hash: fieldHash(facts.field, each.document),
      })),
  };
  return PARTS[gate].flatMap((part) => of[part]());
}

/** The hash of a signature: who says what about which content, from which page. */
export function signatureHash(
  signature: Pick<Signature, 'gate' | 'person' | 'meaning' | 'page' | 'bound' | 'at' | 'zone'>,
): Hash {
  const { gate, person, meaning, page, bound, at, zone } = signature;
  return hashOf('signature', { gate, person, meaning, page, bound, at, zone });
}

/** Parts of a signature whose present hash is another one, or that are gone. Ids of rule sets may change, hashes may not. */
export function movedParts(
  signature: Pick<Signature, 'gate' | 'bound' | 'document'>,
  facts: BindFacts,
): BoundPart[] {
  if (!Object.hasOwn(MEANINGS, signature.gate)) return [];
  const counted = signature.bound
    .find((part) => part.part === 'findings')
    ?.of.split(':')
    .at(-1);
  const narrow: Narrow = {
    ...(signature.document ? { document: signature.document } : {}),
    ...(counted === undefined ? {} : { findings: Number(counted) }),
  };
  const present = boundParts(signature.gate as SignedGate, facts, narrow);
  return signature.bound.filter((bound) => {
    const same = present.find(
      (each) => each.part === bound.part && (bound.part === 'rules' || each.of === bound.of),
    );
    return same?.hash !== bound.hash;
  });
}

/** True while every bound part stands as it was signed and no void row names the signature. */
export function isValid(
  signature: Pick<Signature, 'id' | 'gate' | 'bound' | 'document'>,
  facts: BindFacts,
  voided: readonly Id[] = [],
): boolean {
  return !voided.includes(signature.id) && movedParts(signature, facts).length === 0;
}
