/* Every endpoint with the act of the table of permissions that guards it, method by method. */

/** Acts of the stage table, posted by name. */
export const BY_NAME = 'acts of the stage table';
/** Reached without a sign-in; what it does is guarded by itself. */
export const OPEN = 'open';

type Methods = Partial<Record<'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE', string | string[]>>;
const CASE = 'sites/[site]/cases/[number]';
const PERSON = 'sites/[site]/people/[person]';

/** Path below /api/v1, without `.ts`; a POST of `viaForm` stands for its other methods. */
export const ENDPOINTS: Readonly<Record<string, Methods>> = {
  'first-coordinator': { POST: OPEN },
  invite: { POST: OPEN },
  session: { POST: OPEN, DELETE: 'session' },
  theme: { POST: 'session' },
  password: { POST: 'password' },
  'sessions/index': { GET: 'session', DELETE: 'session', POST: 'session' },
  'sessions/[id]': { DELETE: 'session', POST: 'session' },
  calculations: { POST: 'calculate' },
  methods: { GET: 'read' },
  'sites/[site]/systems/index': { GET: 'read' },
  'sites/[site]/systems/[tag]/index': { GET: 'read' },
  'sites/[site]/systems/[tag]/evaluation': { GET: 'read' },
  'sites/[site]/systems/[tag]/difference': { GET: 'read' },
  'sites/[site]/systems/[tag]/revisions/index': { GET: 'read' },
  'sites/[site]/systems/[tag]/revisions/[revision]': { GET: 'read' },
  'sites/[site]/relief-points/index': { GET: 'read' },
  'sites/[site]/cases/index': { GET: 'read', POST: 'raise' },
  [`${CASE}/index`]: { GET: 'read' },
  [`${CASE}/can`]: { GET: 'read' },
  [`${CASE}/open-points`]: { GET: 'read' },
  [`${CASE}/trail`]: { GET: 'read-trail-of-case' },
  [`${CASE}/copy`]: { POST: 'copy' },
  [`${CASE}/brief`]: { PATCH: 'edit-brief', POST: 'edit-brief' },
  [`${CASE}/seats`]: { POST: 'nominate' },
  [`${CASE}/affected`]: { GET: 'read', POST: 'answer-affected' },
  [`${CASE}/documents/[tag]`]: { GET: 'read', PATCH: 'edit-document', POST: 'edit-document' },
  [`${CASE}/acts/[act]`]: { POST: BY_NAME },
  [`${CASE}/unseen/index`]: { POST: 'unseen' },
  [`${CASE}/unseen/reveal`]: { POST: 'reveal' },
  [`${CASE}/unseen/[id]/reconcile`]: { POST: 'reconcile' },
  [`${CASE}/agreements/[document]/[...sheet]`]: {
    PUT: 'agree',
    DELETE: 'undo-agreement',
    POST: ['agree', 'undo-agreement'],
  },
  [`${CASE}/findings/index`]: { GET: 'read', POST: 'raise-finding' },
  [`${CASE}/findings/[finding]/[turn]`]: { POST: ['answer-finding', 'close-finding', 'reopen-finding'] },
  [`${CASE}/field/index`]: { GET: 'read' },
  [`${CASE}/field/entries`]: { POST: ['enter-field', 'upload'] },
  [`${CASE}/field/discrepancies/[k]/fix`]: { POST: 'fix' },
  [`${CASE}/field/discrepancies/[k]/see-again`]: { POST: ['see-again', 'upload'] },
  [`${CASE}/field/discrepancies/[k]/send-back`]: { POST: 'send-back' },
  'sites/[site]/due-items/index': { POST: ['require', 'do-due'] },
  'sites/[site]/due-items/[id]/[act]': { POST: ['do-due', 'accept-due', 'reject-due', 'waive-due'] },
  'sites/[site]/files/[id]': { GET: 'read' },
  'sites/[site]/people/index': { GET: 'read', POST: 'administer' },
  [`${PERSON}/index`]: { GET: 'read', PATCH: 'administer', PUT: 'administer', POST: 'administer' },
  [`${PERSON}/roles`]: { PUT: 'administer', POST: 'administer' },
  [`${PERSON}/[act]`]: { POST: 'administer' },
};
