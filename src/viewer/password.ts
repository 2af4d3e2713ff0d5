import 'server-only';
import { hash, verify } from '@node-rs/argon2';

const COST = { memoryCost: 19_456, timeCost: 2, parallelism: 1, outputLen: 32 };

export const hashPassword = (password: string): Promise<string> => hash(password, COST);

let standIn: Promise<string> | undefined;

/** Compares with a hash of nothing known where there is no account, so that both answers take the same work. */
export async function passwordMatches(passwordHash: string | null, password: string): Promise<boolean> {
  standIn ??= hashPassword(crypto.randomUUID());
  const matches = await verify(passwordHash ?? (await standIn), password);
  return matches && passwordHash !== null;
}
