/* The messages of the local mail catcher as JSON, the newest first; exists only while the catcher runs. */
import { type APIRoute } from 'astro';
import { json } from '@/http';

/** `?to=` keeps one receiver's, `?contains=` those whose subject contains a text. */
export const GET: APIRoute = ({ locals, url }) => {
  if (!locals.catcher) return new Response(null, { status: 404 });
  const to = url.searchParams.get('to');
  const contains = url.searchParams.get('contains');
  const found = locals.catcher
    .list()
    .filter((mail) => to === null || mail.to.includes(to))
    .filter((mail) => contains === null || mail.subject.includes(contains));
  return json({ messages: found });
};
