/* How often a password may be tried: counted per account and per address, in memory. */
import { RateLimiterMemory } from 'rate-limiter-flexible';
import { type Failed, fail } from '@domain/result';

/** Failures of one account before it rests. */
export const TRIES_PER_ACCOUNT = 5;
/** Failures from one address, whatever the accounts, before it rests. */
export const TRIES_PER_ADDRESS = 60;
/** How long either rests, seconds. */
export const REST_SECONDS = 15 * 60;

/** Counts attempts; one instance a server. */
export type Limits = { account: RateLimiterMemory; address: RateLimiterMemory };

/** Fresh counters. */
export function createLimits(): Limits {
  const limiter = (points: number) => new RateLimiterMemory({ points, duration: REST_SECONDS });
  return { account: limiter(TRIES_PER_ACCOUNT), address: limiter(TRIES_PER_ADDRESS) };
}

function tooMany(milliseconds: number): Failed {
  const minutes = Math.max(1, Math.ceil(milliseconds / 60_000));
  return fail(
    'TOO_MANY',
    `Too many attempts. Try again in ${minutes} ${minutes === 1 ? 'minute' : 'minutes'}.`,
  );
}

async function count(limiter: RateLimiterMemory, key: string, allowed: number): Promise<Failed | null> {
  const { consumedPoints, msBeforeNext } = await limiter.penalty(key, 1);
  if (consumedPoints <= allowed) return null;
  if (consumedPoints === allowed + 1) await limiter.block(key, REST_SECONDS);
  return tooMany(consumedPoints === allowed + 1 ? REST_SECONDS * 1_000 : msBeforeNext);
}

/**
 * Counts an attempt before the password is looked at, so that parallel attempts are counted too.
 * @returns a refusal when the account or the address rests
 */
export async function countAttempt(limits: Limits, account: string, address: string): Promise<Failed | null> {
  return (
    (await count(limits.address, address, TRIES_PER_ADDRESS)) ??
    (await count(limits.account, account, TRIES_PER_ACCOUNT))
  );
}

/** Forgets the account's failures after a right password, and takes this attempt off the address. */
export async function forgive(limits: Limits, account: string, address: string): Promise<void> {
  await limits.account.delete(account);
  await limits.address.reward(address, 1);
}
