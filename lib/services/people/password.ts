import { hash, verify } from '@node-rs/argon2';

/** argon2id as OWASP's password storage cheat sheet has it: 19 MiB, two passes, one lane. */
const cost = { memoryCost: 19_456, timeCost: 2, parallelism: 1 };

export function hashPassword(password: string): Promise<string> {
  return hash(password, cost);
}

let nobodysHash: Promise<string> | undefined;

/** Takes as long where there is no account, so that the time of an answer does not tell which addresses have one. */
export async function passwordMatches(passwordHash: string | null, password: string): Promise<boolean> {
  nobodysHash ??= hashPassword('the password of nobody');
  const matches = await verify(passwordHash ?? (await nobodysHash), password);
  return matches && passwordHash !== null;
}
