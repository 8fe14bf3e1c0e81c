import 'server-only';
import { hash, parseOptions, verify } from '@node-rs/argon2';
import { normalisePassword } from '@/lib/domain/account/password';

/**
 * Argon2id, the library's default algorithm, at 19 MiB, 2 passes, 1 lane.
 * Source: OWASP Cheat Sheet Series, "Password Storage", Argon2id: m=19456 (19 MiB), t=2, p=1 as a minimum.
 */
const cost = { memoryCost: 19_456, timeCost: 2, parallelism: 1, outputLen: 32 } as const;

/** A password as it is stored: PHC string with its own random salt. */
export function hashPassword(password: string): Promise<string> {
  return hash(normalisePassword(password), cost);
}

/**
 * Whether the password is the one that was hashed. With no hash, since there is no such account, the same work is done on
 * one that fits no password, so that the time taken tells nothing.
 */
export async function verifyPassword(stored: string | null, password: string): Promise<boolean> {
  const fits = await verify(stored ?? (await strangersHash()), normalisePassword(password));
  return stored !== null && fits;
}

/** Whether a stored hash was made with less than the present cost. */
export function isOutdated(stored: string): boolean {
  const made = parseOptions(stored);
  return made.memoryCost < cost.memoryCost || made.timeCost < cost.timeCost;
}

let strangers: Promise<string> | undefined;

function strangersHash(): Promise<string> {
  strangers ??= hashPassword(crypto.randomUUID());
  return strangers;
}
