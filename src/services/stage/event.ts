/* From a request to the event that the machine of the case takes. */
import { type DueItem, type GateFacts, missingApprovers, seatsOf } from '@domain/case';
import { changesPlant } from '@domain/field';
import { type OpenPoint } from '@domain/result';
import { richFromText } from '@domain/text';
import { type CaseEvent } from '@workflows/case';
import { type CaseFile, domainSeats } from '../case-file';
import { type Actor, type Ctx, whoOf } from '../context';
import { mergeOnto } from './carry-over';
import { documentOf } from './revisions';
import { type StageRequest } from './stage-act';
import { type StageBody } from './types';

/** The facts with the deficiencies that come with the signature itself: an approver takes them on as they sign. */
export function withProposed(facts: GateFacts, file: CaseFile, actor: Actor, body: StageBody): GateFacts {
  const proposed = (body.deficiencies ?? []).flatMap((one): DueItem[] => {
    const of = facts.documents.find((document) =>
      document.outcomes.some((outcome) => outcome.hash === one.outcome),
    );
    const outcome = of?.outcomes.find((each) => each.hash === one.outcome);
    if (!of || !outcome) return [];
    return [
      {
        id: `proposed-${one.outcome}`,
        kind: 'deficiency',
        case: file.row.id,
        document: of.document,
        subject: outcome.subject,
        text: outcome.sentence,
        owner: one.owner,
        due: one.due,
        state: 'open',
        interim: richFromText(one.interim),
        outcome: one.outcome,
        asked: { by: actor.person.id, at: '' },
      },
    ];
  });
  return proposed.length === 0 ? facts : { ...facts, dueItems: [...facts.dueItems, ...proposed] };
}

/** True when no other approver's signature is missing after this one. */
function isLast(facts: GateFacts, actor: Actor): boolean {
  const persons = [actor.person.id, ...actor.standsFor];
  return missingApprovers(facts).unsigned.every((person) => persons.includes(person));
}

/** True when the field sheet would see something of the change. */
export function seenOnPlant(facts: GateFacts): boolean {
  return facts.documents.some((of) => of.doc !== undefined && changesPlant(of.doc, of.baseDoc));
}

/** The machine's event of a request. */
export async function eventOf(
  ctx: Ctx,
  file: CaseFile,
  actor: Actor,
  facts: GateFacts,
  request: StageRequest,
  open: readonly OpenPoint[],
): Promise<CaseEvent> {
  const by = {
    actor: { id: actor.person.id, roles: actor.roles, seats: seatsOf(whoOf(actor), domainSeats(file.seats)) },
  };
  const reason = request.body.reason ?? '';
  const document = documentOf(file, request.body.document)?.document.id ?? '';
  switch (request.act) {
    case 'SIGN':
      return { type: 'SIGN', last: isLast(facts, actor), plant: seenOnPlant(facts), open, ...by };
    case 'REFUSE':
      return { type: 'REFUSE', reason, ...by };
    case 'HOLD':
      return { type: 'HOLD', reason, review: request.body.review ?? '', ...by };
    case 'RESUME':
      return { type: 'RESUME', ...by };
    case 'WITHDRAW':
      return { type: 'WITHDRAW', reason, ...by };
    case 'ISSUE':
      return { type: 'ISSUE', document, open, ...by };
    case 'DROP':
      return { type: 'DROP', document, reason, ...by };
    case 'CARRY_OVER':
      return {
        type: 'CARRY_OVER',
        document,
        clean: await isCleanMerge(ctx, file, request.body.document),
        ...by,
      };
    case 'RETURN-own':
    case 'RETURN-check':
    case 'RETURN-approval':
    case 'RETURN-field':
      return { type: 'RETURN', to: request.body.to ?? 'scenarios', reason, ...by };
    default:
      return { type: 'PASS', open, ...by };
  }
}

async function isCleanMerge(ctx: Ctx, file: CaseFile, tag: string | undefined): Promise<boolean> {
  const one = documentOf(file, tag);
  const merge = one && (await mergeOnto(ctx.db, one));
  return merge !== undefined && merge.conflicts.length === 0;
}
