/* One numbered revision of a system: its document. */
import { type APIRoute } from 'astro';
import { fail } from '@domain/result';
import { systemDocument } from '@services/views/system';
import { answer, refuse, siteActor } from '@/http';

export const GET: APIRoute = async (context) => {
  const at = siteActor(context);
  if (!at.ok) return refuse(context, at.problem);
  const { tag = '', revision = '' } = context.params;
  if (!/^\d{1,6}$/.test(revision))
    return refuse(
      context,
      fail('UNKNOWN', `"${revision.slice(0, 40)}" is not the number of a revision.`).problem,
    );
  return answer(context, await systemDocument(at.value.ctx, at.value.actor, tag, Number(revision)));
};
