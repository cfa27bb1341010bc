import { dictionary } from '@zxcvbn-ts/language-common';
import argon2 from 'argon2';
import type { FieldError } from '@shared/problem';
import { passwordLength } from '@shared/sign-in/password-length';
import { atMost } from './at-most';

const common = new Set(dictionary['passwords-common']);

/** OWASP's argon2id settings (Password Storage Cheat Sheet): 19 MiB, two passes, one lane. */
const settings = { type: argon2.argon2id, memoryCost: 19_456, timeCost: 2, parallelism: 1 };

/** Hashing is dear by design: a flood of sign-ins may not take all threads and memory from others. */
const inTurn = atMost(2, 60);

/** @throws Problem 503 when too many hashes wait for their turn */
export const hashPassword = (password: string) => inTurn(() => argon2.hash(password, settings));

/**
 * Whether the password fits; without a hash it takes the same time and says no.
 * @throws Problem 503 when too many hashes wait for their turn
 */
export async function passwordFits(hash: string | null, password: string): Promise<boolean> {
  dummyHash ??= hashPassword('nobody has this password');
  const against = hash ?? (await dummyHash);
  const fits = await inTurn(() => argon2.verify(against, password));
  return fits && hash !== null;
}
let dummyHash: Promise<string> | undefined;

/**
 * What is wrong with a new password: length and known lists only, no composition rules.
 * @param context words an attacker would try first: the person's name, address, organisation
 * @param field the name under which the password was sent
 */
export function passwordFaults(
  password: string,
  context: readonly string[],
  field = 'password',
): FieldError[] {
  const fault = (reason: string, message: string) => [{ field, reason, message }];
  const { min, max } = passwordLength;
  const length = [...password].length;
  if (length < min) return fault('password-short', `Use at least ${min} characters.`);
  if (length > max) return fault('password-long', `Use at most ${max} characters.`);
  const plain = password.toLowerCase();
  const bare = plain.replace(/[\d\W_]+/gu, '');
  if (common.has(plain) || (bare.length > 3 && common.has(bare))) {
    return fault('password-common', 'This password is on lists that attackers try.');
  }
  const words = context.flatMap((text) => text.toLowerCase().split(/[^\p{L}\p{N}]+/u));
  const left = words
    .filter((word) => word.length > 3)
    .reduce((rest, word) => rest.replaceAll(word, ''), plain);
  if (left !== plain && left.replace(/[\d\W_]+/gu, '').length < 4) {
    return fault('password-common', 'This password is made of your own name or address.');
  }
  return [];
}
