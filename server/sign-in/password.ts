import { dictionary } from '@zxcvbn-ts/language-common';
import argon2 from 'argon2';
import type { FieldError } from '@shared/problem';

const common = new Set(dictionary['passwords-common']);

/** OWASP's argon2id settings (Password Storage Cheat Sheet): 19 MiB, two passes, one lane. */
const settings = { type: argon2.argon2id, memoryCost: 19_456, timeCost: 2, parallelism: 1 };

export const hashPassword = (password: string) => argon2.hash(password, settings);

/** Whether the password fits; without a hash it takes the same time and says no. */
export async function passwordFits(hash: string | null, password: string): Promise<boolean> {
  dummyHash ??= hashPassword('nobody has this password');
  const fits = await argon2.verify(hash ?? (await dummyHash), password);
  return fits && hash !== null;
}
let dummyHash: Promise<string> | undefined;

/**
 * What is wrong with a new password: length (10 to 128) and known lists only, no composition rules.
 * @param context words an attacker would try first: the person's name, address, organisation
 */
export function passwordFaults(password: string, context: readonly string[]): FieldError[] {
  const fault = (reason: string, message: string) => [{ field: 'password', reason, message }];
  if ([...password].length < 10) return fault('too-short', 'Use at least 10 characters.');
  if ([...password].length > 128) return fault('too-long', 'Use at most 128 characters.');
  const plain = password.toLowerCase();
  if (common.has(plain)) return fault('common', 'This password is on lists that attackers try.');
  const words = context.flatMap((text) => text.toLowerCase().split(/[^\p{L}\p{N}]+/u));
  if (words.some((word) => word.length > 3 && plain.replace(/[\d\W_]+/gu, '') === word)) {
    return fault('guessable', 'This password is made of your own name or address.');
  }
  return [];
}
