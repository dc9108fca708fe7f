import { hash, verify } from '@node-rs/argon2';

/** Argon2id is number 2 in the library's list, which cannot be imported under isolated modules. */
const ARGON2ID = 2;
const PARAMETERS = { algorithm: ARGON2ID, memoryCost: 19_456, timeCost: 2, parallelism: 1 };

export function hashPassphrase(passphrase: string): Promise<string> {
  return hash(passphrase, PARAMETERS);
}

let decoy: Promise<string> | undefined;

/**
 * Whether a passphrase fits a hash. With no hash (an unknown person) it takes as long as with one, so that the time
 * of an answer does not tell who has an account.
 */
export async function fitsPassphrase(hashed: string | null, passphrase: string): Promise<boolean> {
  if (hashed !== null) return verify(hashed, passphrase);
  decoy ??= hashPassphrase('a passphrase that nobody has');
  await verify(await decoy, passphrase);
  return false;
}
