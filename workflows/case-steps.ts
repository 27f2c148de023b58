/* The steps that the rows of the stage table share: effects by name, changes of the context, ways back and aside. */
import { setup } from 'xstate';
import { type CaseDocumentState, type Stage } from '@domain/case';
import { caseGuards } from './case-guards';
import { CASE_EFFECTS, type CaseContext, type CaseEffect, type CaseEvent } from './case-types';

/** Effects are names: the machine says which are due, the service writes them in its transaction. */
const effects = Object.fromEntries(CASE_EFFECTS.map((name) => [name, () => undefined])) as unknown as Record<
  CaseEffect,
  () => void
>;

export const base = setup({
  types: {} as { context: CaseContext; events: CaseEvent; input: CaseContext },
  guards: caseGuards,
  actions: effects,
});

type Update = (context: CaseContext, event: CaseEvent) => Partial<CaseContext>;
const change = (update: Update) => base.assign(({ context, event }) => update(context, event));

const setAll =
  (from: CaseDocumentState[], state: CaseDocumentState): Update =>
  (context) => ({
    documents: context.documents.map((each) => (from.includes(each.state) ? { ...each, state } : each)),
  });
const setNamed =
  (state: CaseDocumentState): Update =>
  (context, event) => ({
    documents: context.documents.map((each) =>
      'document' in event && each.id === event.document ? { ...each, state } : each,
    ),
  });

export const approveAll = change(setAll(['open'], 'approved'));
export const issueAll = change(setAll(['open', 'approved'], 'issued'));
export const reopenAll = change(setAll(['approved'], 'open'));
export const dropAll = change(setAll(['open', 'approved'], 'dropped'));
export const issueNamed = change(setNamed('issued'));
export const dropNamed = change(setNamed('dropped'));
export const takeEnd = change((context, event) =>
  event.type === 'EXTEND' ? { ends: event.ends, extensions: context.extensions + 1 } : {},
);
export const loseEnd = change(() => ({ ends: undefined }));
export const removeNamed = change((context, event) =>
  event.type === 'REMOVE' ? { removed: [...context.removed, event.document] } : {},
);
const act = change(() => ({ acted: true }));
const holdFrom = (stage: Stage) => change(() => ({ heldFrom: stage }));
export const release = change(() => ({ heldFrom: undefined }));

export const back = ['voidSignatures', 'reviveWorkingRevisions', 'recordReason', reopenAll] as const;
export const reopen = ['voidSignatures', 'reviveWorkingRevisions', reopenAll] as const;
const carried = ['carryOver', 'voidSignatures', 'reviveWorkingRevisions', reopenAll] as const;

export const hold = (stage: Stage) =>
  ({ guard: 'hold', target: 'on-hold', actions: ['recordReason', 'pauseClocks', holdFrom(stage)] }) as const;
export const withdraw = [
  { guard: 'withdraw', target: 'withdrawn', actions: ['recordReason', 'dropRevisions', dropAll] },
  { guard: 'withdrawActed', target: 'due-for-removal', actions: ['recordReason', 'makeRemovalDue'] },
] as const;
export const carryOn = [
  { guard: 'carryClean', target: 'check', actions: [...carried] },
  { guard: 'carryConflict', target: 'scenarios', actions: [...carried] },
] as const;
export const recordActed = { guard: 'recordActed', actions: ['recordActed', act] } as const;
