import { hash, verify } from '@node-rs/argon2';

/** argon2id with the parameters of OWASP's Password Storage Cheat Sheet (19 MiB, 2 passes). */
const parameters = { algorithm: 2, memoryCost: 19456, timeCost: 2, parallelism: 1 };

export function hashPassword(password: string): Promise<string> {
  return hash(password, parameters);
}

/** Of a password that nobody has: an unknown name takes as long as a wrong password. */
const nobody = hashPassword('no one signs in with this');

export async function passwordFits(password: string, passwordHash: string | undefined): Promise<boolean> {
  const fits = await verify(passwordHash ?? (await nobody), password);
  return fits && passwordHash !== undefined;
}
