/* The state of an unseen check: what is left to enter, in which order, whether it is revealed, and how the two compare. */
import { sameValue, type Q, type QuantityContext } from '@engine/quantity';
import { quantityOf } from '@domain/basis';
import { type DocumentFacts, type GateFacts } from './gate-facts';
import { scenarioName } from './gates/scenarios';
import { type Id, type UnseenEntry } from './types';
import { compareUnseen, type UnseenCompared } from './unseen-compare';
import {
  governingScenario,
  groupsToCheck,
  itemsOfGroup,
  originatorsValue,
  type UnseenItem,
} from './unseen-items';

export { identicalShare } from './unseen-compare';

export type UnseenStep = 'reading' | 'figure' | 'reveal' | 'done';
export type UnseenState = {
  items: readonly UnseenItem[];
  /** Items without an entry that counts. */
  missing: readonly UnseenItem[];
  /** Items that may be entered now: figures only after every reading and choice. */
  mayEnter: readonly UnseenItem[];
  step: UnseenStep;
  revealed: boolean;
};
export type UnseenDifference = {
  item: UnseenItem;
  entry: UnseenEntry;
  theirs: Q | string | undefined;
  compared: UnseenCompared;
};

type Facts = Pick<GateFacts, 'case' | 'unseen' | 'reveals'> & { rules?: { unseenFactor?: number } };

function sameAs(one: Q | string | undefined, other: Q | string | undefined): boolean {
  if (typeof one === 'string' || typeof other === 'string' || !one || !other) return one === other;
  return sameValue(one, other);
}

/** The last entry of an item; none when the originator's value moved after it was revealed, for then it must be worked again. */
export function entryOfItem(of: DocumentFacts, item: UnseenItem, facts: Facts): UnseenEntry | undefined {
  const own = facts.unseen.filter((each) => each.document === of.document && each.scope === item.scope);
  const last = own.reduce<UnseenEntry | undefined>(
    (best, each) => (!best || each.round > best.round ? each : best),
    undefined,
  );
  if (!last) return undefined;
  const shown = facts.reveals.some((each) => each.document === of.document && each.at >= last.at);
  const moved = shown && last.against !== undefined && !sameAs(last.against, originatorsValue(of, item));
  return moved ? undefined : last;
}

/** What the unseen check of one system still needs. */
export function unseenState(of: DocumentFacts, facts: Facts): UnseenState {
  const groups = groupsToCheck(of, facts.case.class);
  const all = of.doc?.groups ?? [];
  const items = groups.flatMap((group) =>
    itemsOfGroup(of, group, all.indexOf(group) + 1, facts.unseen, scenarioName),
  );
  const unique = items.filter(
    (item, index) => items.findIndex((each) => each.scope === item.scope) === index,
  );
  const entries = unique.map((item) => entryOfItem(of, item, facts));
  const missing = unique.filter((_item, index) => entries[index] === undefined);
  const early = missing.filter((item) => item.layer !== 'figure');
  const last = entries.reduce((at, entry) => (entry && entry.at > at ? entry.at : at), '');
  const revealed =
    missing.length === 0 &&
    (unique.length === 0 || facts.reveals.some((each) => each.document === of.document && each.at >= last));
  const step = early.length > 0 ? 'reading' : missing.length > 0 ? 'figure' : revealed ? 'done' : 'reveal';
  return { items: unique, missing, mayEnter: early.length > 0 ? early : missing, step, revealed };
}

/** Checker against originator, item by item. Only to be shown, or to shut a gate, after the reveal. */
export function unseenDifferences(
  of: DocumentFacts,
  facts: Facts,
  context?: QuantityContext,
): UnseenDifference[] {
  return unseenState(of, facts).items.flatMap((item) => {
    const entry = entryOfItem(of, item, facts);
    const mine = entry?.value ?? entry?.word;
    if (!entry || mine === undefined) return [];
    const theirs = originatorsValue(of, item);
    const compared = compareUnseen({
      quantity: item.quantity,
      label: item.label,
      mine,
      theirs,
      ...limitOf(of, item, theirs),
      ...(facts.rules?.unseenFactor === undefined ? {} : { factor: facts.rules.unseenFactor }),
      ...(context ? { context } : {}),
    });
    return [{ item, entry, theirs, compared }];
  });
}

/** What divides adequate from inadequate: the installed area for a required one, 3 % of set for the inlet line. */
function limitOf(
  of: DocumentFacts,
  item: UnseenItem,
  theirs: Q | string | undefined,
): { limit?: Q; set?: Q } {
  const group = of.evaluation?.groups[item.group];
  if (item.quantity === 'required-area' && theirs && typeof theirs !== 'string' && group?.use) {
    const governs = item.scope.startsWith(`sheets/${group.governing ?? ''}#`);
    return governs ? { limit: { value: theirs.value / group.use, unit: theirs.unit } } : {};
  }
  if (item.quantity !== 'inlet-loss' && item.quantity !== 'back-pressure') return {};
  const point = of.doc?.reliefPoints.find((each) => item.scope.startsWith(`points/${each.id}#`));
  const set = quantityOf(point?.set);
  if (!set) return {};
  if (item.quantity === 'back-pressure') return { set };
  const unit = typeof theirs === 'object' ? theirs.unit : set.unit;
  const least =
    unit === '%' ? { value: 3, unit } : { value: 0.03 * set.value, unit: set.unit.replace(/_g$|g$/, '') };
  return { set, limit: least };
}

/** The groups whose governing scenario checker and originator chose differently. */
export function otherwiseGoverned(of: DocumentFacts, facts: Facts): Id[] {
  return unseenDifferences(of, facts)
    .filter(
      (each) =>
        each.item.quantity === 'governing-scenario' &&
        each.entry.word !== governingScenario(of, each.item.group),
    )
    .map((each) => each.item.group);
}

/**
 * Whether a case still has something for the checker to work unseen: then its results stay hidden from that person.
 * Before the check it always has, unless a former round stands complete and revealed.
 */
export function unseenLeft(facts: Facts & Pick<GateFacts, 'documents'>): boolean {
  const stage = facts.case.stage === 'on-hold' ? facts.case.heldFrom : facts.case.stage;
  if (stage !== 'draft' && stage !== 'scenarios' && stage !== 'check') return false;
  const states = facts.documents
    .filter((of) => of.state !== 'dropped' && of.doc)
    .map((of) => ({ of, state: unseenState(of, facts) }));
  if (states.some(({ state }) => !state.revealed)) return true;
  return (
    stage !== 'check' &&
    !states.every(({ of }) => facts.reveals.some((each) => each.document === of.document))
  );
}
