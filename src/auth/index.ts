/* The public face of sign-in: who asks, sessions, passwords, accounts. Lucia and argon2 stay behind it. */
export { type Auth, openAuth } from './auth';
export {
  acceptToken,
  changePassword,
  createFirstCoordinator,
  deactivate,
  type FirstCoordinator,
  makeToken,
} from './account';
export { hashPassword, PASSWORD_LENGTH, passwordFaults, verifyPassword } from './credentials';
export { type Current, rolesAt, type SiteRoles, whoAsks } from './current';
export { SESSION_COOKIE, SESSION_HOURS } from './lucia';
export {
  confirmPassword,
  type From,
  listSessions,
  openSession,
  revokeOthers,
  revokeSession,
  type SessionView,
  signIn,
  type SignedIn,
  signOut,
} from './session';
export { endSessionsOf, hashToken, sweepSessions } from './session-rows';
