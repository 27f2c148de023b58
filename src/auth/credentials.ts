/* Passwords: hashed by argon2id, verified in even time, and what a new one must be. */
import { hash, verify } from '@node-rs/argon2';
import { type FieldError } from '@domain/result';

/* The package's default algorithm is argon2id; parameters: OWASP Password Storage Cheat Sheet (19 MiB, 2 passes, 1 lane). */
const PARAMETERS = { memoryCost: 19_456, timeCost: 2, parallelism: 1, outputLen: 32 };

/** Characters that a password has at least and at most. */
export const PASSWORD_LENGTH = { min: 12, max: 200 };

/* Often-used passwords of twelve or more characters, from memory. */
const COMMON = new Set([
  ...[
    '123456789012',
    '1234567890123',
    '123456123456',
    '111111111111',
    '000000000000',
    'qwertyuiop123',
    'qwerty123456',
  ],
  ...['qwertyuiop[]', 'asdfghjkl123', '1q2w3e4r5t6y', 'passwordpassword', 'password1234', 'password12345'],
  ...['password123456', 'mypassword123', 'administrator', 'administrator1', 'welcome12345', 'welcome123456'],
  ...[
    'letmeinletmein',
    'letmein12345',
    'iloveyou1234',
    'iloveyouforever',
    'changemechangeme',
    'changeme1234',
  ],
  ...['correcthorsebatterystaple', 'trustno1trustno1', 'abcdefghijkl', 'abcd12345678', 'abc123abc123'],
  ...['unbelievable', 'summer2025summer', 'winter2025winter', 'football1234', 'sunshine1234', 'superman1234'],
]);

/** The same text in the same characters, however it was typed. */
const normal = (password: string): string => password.normalize('NFKC');

/** Hashes a password for storage. */
export function hashPassword(password: string): Promise<string> {
  return hash(normal(password), PARAMETERS);
}

let decoy: Promise<string> | undefined;

/** Whether a password is the one of a stored hash; without a hash it works as long and answers no. */
export async function verifyPassword(stored: string | null | undefined, password: string): Promise<boolean> {
  decoy ??= hashPassword('nobody has this password');
  const right = await verify(stored ?? (await decoy), normal(password).slice(0, 1_000));
  return right && stored != null;
}

/** What is wrong with a new password, each in a sentence; empty when it is good. */
export function passwordFaults(password: string, email: string): FieldError[] {
  const plain = normal(password).toLowerCase();
  const mail = email.trim().toLowerCase();
  const fault = (code: string, sentence: string): FieldError[] => [{ path: 'password', code, sentence }];
  if (plain.length < PASSWORD_LENGTH.min) {
    return fault(
      'too_short',
      `The password has ${plain.length} characters; it needs at least ${PASSWORD_LENGTH.min}.`,
    );
  }
  if (plain.length > PASSWORD_LENGTH.max) {
    return fault('too_long', `The password is too long; at most ${PASSWORD_LENGTH.max} characters are kept.`);
  }
  if (mail !== '' && (plain === mail || plain === mail.split('@')[0])) {
    return fault('is_email', 'The password must not be the e-mail address.');
  }
  if (COMMON.has(plain) || new Set(plain).size < 4) {
    return fault(
      'too_common',
      'This password is among the first that are guessed; take a longer or rarer one.',
    );
  }
  return [];
}
