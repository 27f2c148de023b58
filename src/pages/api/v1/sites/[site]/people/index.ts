/* /api/v1/sites/{site}/people: GET lists the people of the site, POST adds one. */
import { type APIRoute } from 'astro';
import { addPerson } from '@services/administer/add-person';
import { addPersonSchema } from '@services/administer/bodies';
import { peopleView } from '@services/administer/views';
import { answer, refuse, siteActor, writeOf } from '@/http';

export const GET: APIRoute = async (context) => {
  const asked = siteActor(context);
  if (!asked.ok) return refuse(context, asked.problem);
  return answer(context, await peopleView(asked.value.ctx, asked.value.actor));
};

export const POST: APIRoute = async (context) => {
  const { body, once } = await writeOf(context, addPersonSchema, 'person');
  const asked = siteActor(context);
  if (!asked.ok) return refuse(context, asked.problem);
  const { ctx, actor } = asked.value;
  const people = `/s/${actor.site.slug}/people`;
  const result = await addPerson(ctx, actor, { body, once });
  const back = result.ok
    ? `${people}/${result.value.id}?done=${result.value.invited ? 'invited' : 'joined'}`
    : people;
  return answer(context, result, { status: 201, page: `${people}/new`, back });
};
