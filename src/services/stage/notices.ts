/* Which notice each act of the stage table sends. */
import { type Happened, notify } from '../notify';
import { documentOf } from './revisions';
import { type StageWrite } from './types';

function passed(write: StageWrite): Happened | undefined {
  if (write.reached === 'scenarios') return { event: 'case.waits-for-analysis' };
  if (write.reached === 'check') return { event: 'case.waits-for-check' };
  if (write.reached === 'approval') return { event: 'case.waits-for-signature' };
  return undefined;
}

function signed(write: StageWrite): Happened[] {
  const told: Happened[] = [{ event: 'case.signed' }];
  if (write.reached === 'field') told.push({ event: 'case.waits-in-field' });
  if (write.reached === 'in-force')
    told.push(
      ...write.file.documents.map((one): Happened => ({ event: 'case.in-force', system: one.document.tag })),
    );
  return told;
}

function happened(write: StageWrite): Happened[] {
  const { act, file, body, reached } = write;
  if (act === 'SIGN') return signed(write);
  if (act.startsWith('RETURN-')) return [{ event: 'case.returned', to: reached }];
  if (act === 'REFUSE') return [{ event: 'case.refused' }];
  if (act === 'HOLD') return [{ event: 'case.held' }];
  if (act === 'RESUME') return [{ event: 'case.resumed', to: reached }];
  if (act === 'WITHDRAW') return [{ event: 'case.withdrawn' }];
  if (act === 'ISSUE')
    return [{ event: 'case.in-force', system: documentOf(file, body.document)?.document.tag ?? '' }];
  const told = act.startsWith('PASS-') ? passed(write) : undefined;
  return told ? [told] : [];
}

/** Queues the notices of an act in its transaction. */
export async function tellSeats(write: StageWrite): Promise<void> {
  for (const one of happened(write)) await notify(write.trx, write.ctx, write.actor, write.file, one);
}
