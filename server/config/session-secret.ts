import { randomBytes } from 'node:crypto';
import { mkdir, readFile, writeFile } from 'node:fs/promises';
import path from 'node:path';

/** The key that signs session cookies: made on the first run and kept in the data folder, readable by its owner only. */
export async function getSessionSecret(dataFolder: string): Promise<string> {
  const file = path.join(dataFolder, 'session-secret');
  await mkdir(dataFolder, { recursive: true });
  try {
    await writeFile(file, randomBytes(48).toString('base64url'), { mode: 0o600, flag: 'wx' });
  } catch (error) {
    if (!isAlreadyThere(error)) throw error;
  }
  const secret = (await readFile(file, 'utf8')).trim();
  if (secret.length < 32) throw new Error(`${file} holds no usable secret. Delete it; a new one is made.`);
  return secret;
}

function isAlreadyThere(error: unknown): boolean {
  return error instanceof Error && 'code' in error && error.code === 'EEXIST';
}
