/* A copy of the invented site for one test file, with its people and the hands by which they act on a case. */
import { copyFileSync, mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { afterAll } from 'vitest';
import { openPoints, type Gate, type GateFacts } from '@domain/case';
import { ok, type Result } from '@domain/result';
import { type Auth, openAuth } from '@auth/index';
import { type Db, openDatabase } from '@data/connection';
import { newId } from '@data/ids';
import { peopleOfSite } from '@data/people';
import { findSiteBySlug } from '@data/site';
import { type SiteRow } from '@data/tables/people';
import { type CaseFile, loadCaseFile } from '@services/case-file';
import { type Actor, type Ctx, today } from '@services/context';
import { gateFacts } from '@services/gate-facts';
import { type Write } from '@services/one-act';
import { pageHash } from '@services/stage/sign';
import { SIGNING, stageAct, type StageAnswer } from '@services/stage/stage-act';
import { type StageAct, type StageBody } from '@services/stage/types';
import { ensureTemplate } from '../../support/prepare';

export type Plant = {
  db: Db;
  ctx: Ctx;
  auth: Auth;
  site: SiteRow;
  password: string;
  /** The data folder of the copy. */
  folder: string;
  /** A person of the invented site by the first name, or by the id. */
  who: (name: string) => Actor;
  byId: (id: string) => Actor;
};

/** A fresh copy of the seeded database; the clock goes on by a second whenever it is asked. */
export async function plant(): Promise<Plant> {
  const template = await ensureTemplate('demo');
  const folder = mkdtempSync(join(tmpdir(), 'setwright-plant-'));
  copyFileSync(template, join(folder, 'setwright.db'));
  const db = openDatabase(join(folder, 'setwright.db'));
  afterAll(async () => {
    await db.destroy();
    rmSync(folder, { recursive: true, force: true });
  });
  const { password } = JSON.parse(readFileSync(join(dirname(template), 'sign-ins.json'), 'utf8')) as {
    password: string;
  };
  const site = await findSiteBySlug(db, 'ketterwold');
  if (!site) throw new Error('the invented site is not there');
  const people = await peopleOfSite(db, site.id);
  let clock = Date.now();
  const ctx: Ctx = { db, now: () => new Date((clock += 1000)), baseUrl: 'http://localhost:4321' };
  const actor = (found: (typeof people)[number] | undefined): Actor => {
    if (!found) throw new Error('nobody is called so');
    const { id, name, email, roles } = found;
    return { person: { id, name, email }, site, roles, standsFor: [] };
  };
  const who = (name: string) => actor(people.find((person) => person.name.startsWith(name)));
  const byId = (id: string) => actor(people.find((person) => person.id === id));
  return { db, ctx, auth: openAuth(db, { secure: false }), site, password, folder, who, byId };
}

/** What a whole request sends; a new key unless one is given. */
export function sent<B>(body: B, version = 0, key: string = newId('element')): Write<B> {
  return {
    body: ok(body),
    version: ok(version),
    once: ok({ key, route: 'test', bodyHash: JSON.stringify(body) }),
  };
}

/** The case with everything known of it. */
export async function fileOf(of: Plant, number: string): Promise<CaseFile> {
  const file = await loadCaseFile(of.db, of.site, number);
  if (!file) throw new Error(`no case ${number}`);
  return file;
}

/** What the gates of the case read now. */
export async function factsOf(of: Plant, number: string): Promise<GateFacts> {
  return gateFacts(of.db, await fileOf(of, number), today(of.ctx, of.site), false);
}

/** The open points of a gate, as one reads them. */
export async function pointsAt(of: Plant, number: string, gate: Gate): Promise<string[]> {
  return openPoints(gate, await factsOf(of, number)).map((point) => `${point.code}: ${point.sentence}`);
}

export type Doing = StageBody & { version?: number; key?: string };

/** One act of the stage table by a person who read the case just now: present version, page in view, right password. */
export async function act(
  of: Plant,
  number: string,
  name: StageAct,
  by: string,
  { version, key, ...given }: Doing = {},
): Promise<Result<StageAnswer>> {
  const file = await fileOf(of, number);
  const signed = SIGNING.includes(name)
    ? { password: of.password, pageHash: pageHash(file, name, given.document) }
    : {};
  return stageAct(of.ctx, of.auth, of.who(by), {
    number,
    act: name,
    ip: '127.0.0.1',
    ...sent<StageBody>({ ...signed, ...given }, version ?? file.row.version, key),
  });
}

/** The value of a result; a refusal fails the test with its sentence and open points. */
export function value<T>(result: Result<T>): T {
  if (result.ok) return result.value;
  const { code, detail, openPoints: open = [], errors = [] } = result.problem;
  const more = [...open.map((point) => point.sentence), ...errors.map((error) => error.sentence)];
  throw new Error([`${code}: ${detail}`, ...more].join('\n  '));
}

/** The code of a refusal; "ok" when there is none. */
export function codeOf(result: Result<unknown>): string {
  return result.ok ? 'ok' : result.problem.code;
}
