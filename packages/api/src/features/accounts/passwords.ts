import { hash, verify } from '@node-rs/argon2';

/** argon2id with the parameters of the OWASP Password Storage Cheat Sheet: 19 MiB, 2 passes, 1 lane. */
const OPTIONS = { memoryCost: 19_456, timeCost: 2, parallelism: 1 } as const;

export const hashPassword = (password: string): Promise<string> => hash(password, OPTIONS);

/**
 * Checks a password. Without a stored hash it spends the same time on a hash that fits nothing, so that the time taken
 * does not tell whether the address is known.
 */
export async function passwordFits(storedHash: string | null, password: string): Promise<boolean> {
  const fits = await verify(storedHash ?? (await decoy()), password);
  return fits && storedHash !== null;
}

let made: Promise<string> | undefined;
const decoy = () => (made ??= hashPassword('fits nobody, ever'));
