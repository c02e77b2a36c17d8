import argon2 from 'argon2';

/** argon2id with the parameters that OWASP recommends: 19 MiB, two passes, one lane. */
const parameters = { type: argon2.argon2id, memoryCost: 19_456, timeCost: 2, parallelism: 1 } as const;

export const hashPassword = (password: string): Promise<string> => argon2.hash(password, parameters);

let decoy: Promise<string> | null = null;

/** Does the same work whether or not there is a hash to compare with, so that the time tells nobody who has an account. */
export async function verifyPassword(hash: string | undefined, password: string): Promise<boolean> {
  decoy ??= hashPassword('the password of nobody');
  const matches = await argon2.verify(hash ?? (await decoy), password).catch(() => false);
  return matches && hash !== undefined;
}
