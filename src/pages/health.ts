/* Whether the server can do its work: the database answers and has every migration. */
import { type APIRoute } from 'astro';
import { schemaIsCurrent } from '@data/connection';
import { json } from '@/http';

/** 200 only when all is good; 503 otherwise, so that a watchdog sees it. */
export const GET: APIRoute = async ({ locals }) => {
  const { db, version } = locals;
  if (await schemaIsCurrent(db)) return json({ status: 'ok', version });
  return json(
    { status: 'failing', version, reason: 'The database does not answer or lacks a migration.' },
    { status: 503 },
  );
};
