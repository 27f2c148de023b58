/* Photographs from the field: kept under their hash before the entry that names them is written. */
import { can, type Act } from '@domain/case';
import { fail, ok, type Result } from '@domain/result';
import { hashOfBytes, keepBytes, pictureType, readBytes } from '@files/store';
import { findFile, noteFile } from '@data/files';
import { newId } from '@data/ids';
import { loadCaseFile, onFile } from '../case-file';
import { type Actor, type Ctx, instant, whoOf } from '../context';

/** The largest photograph that is taken, in bytes. */
export const PHOTOGRAPH_LIMIT = 10_000_000;

const KIND: Act = 'upload';

/** Keeps one photograph of a case; the same bytes again are the same file. TYPE_REFUSED unless it is JPEG, PNG or WebP. */
export async function keepPhotograph(
  ctx: Ctx,
  actor: Actor,
  of: { number: string; folder: string },
  sent: { name: string; bytes: Uint8Array },
): Promise<Result<string>> {
  const file = await loadCaseFile(ctx.db, actor.site, of.number);
  if (!file) return fail('UNKNOWN', `This site has no case ${of.number}.`);
  const may = can(whoOf(actor), KIND, onFile(file));
  if (!may.ok) return fail(may.code, may.sentence);
  const type = pictureType(sent.bytes);
  if (!type) return fail('TYPE_REFUSED', 'A photograph is taken as JPEG, PNG or WebP.');
  if (sent.bytes.byteLength > PHOTOGRAPH_LIMIT)
    return fail('TOO_LARGE', 'A photograph may have 10 MB at most.');
  const sha256 = hashOfBytes(sent.bytes);
  await keepBytes(of.folder, sha256, sent.bytes);
  const row = await noteFile(ctx.db, {
    id: newId('file'),
    siteId: actor.site.id,
    sha256,
    bytes: sent.bytes.byteLength,
    type,
    name: sent.name.slice(0, 200),
    state: 'held',
    byId: actor.person.id,
    at: instant(ctx),
  });
  if (!row) return fail('INTERNAL', 'The photograph could not be kept.');
  return ok(row.id);
}

/** A photograph of the site with its bytes. UNKNOWN for another site's, and where the bytes are not kept here. */
export async function photograph(
  ctx: Ctx,
  actor: Actor,
  folder: string,
  id: string,
): Promise<Result<{ type: string; bytes: Uint8Array }>> {
  const row = await findFile(ctx.db, id);
  if (row?.siteId !== actor.site.id) return fail('UNKNOWN', 'This site has no such file.');
  const bytes = await readBytes(folder, row.sha256);
  return bytes ? ok({ type: row.type, bytes }) : fail('UNKNOWN', 'The bytes of this file are not kept here.');
}
