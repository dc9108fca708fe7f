/** Plates on disk: one file a picture, named by its SHA-256, so the same picture is kept once and never changes. */
import { createHash } from 'node:crypto';
import { mkdir, readFile, rename, writeFile } from 'node:fs/promises';
import path from 'node:path';
import type { PlateFile } from '#shared/contracts/report.ts';
import type { Database } from '#server/database/database.ts';
import { encodePicture } from './encode-picture.ts';
import { toPlateFile } from './model.ts';

export interface FileDeps {
  readonly database: Database;
  readonly environment: { readonly dataFolder: string };
  readonly now: () => Date;
}

const TYPE = 'image/jpeg';

/** Keeps an uploaded picture for a problem; 415 `not-a-picture`. */
export async function keepPicture(
  deps: FileDeps,
  problemId: string,
  userId: string,
  bytes: Buffer,
): Promise<PlateFile> {
  const { data, width, height } = await encodePicture(bytes);
  const sha = createHash('sha256').update(data).digest('hex');
  await writeOnce(placeOf(deps, sha), data);
  const { files } = deps.database.models;
  return deps.database.write(async (transaction) => {
    const [row] = await files.findOrCreate({
      where: { problemId, sha },
      defaults: {
        problemId,
        sha,
        type: TYPE,
        width,
        height,
        bytes: data.length,
        userId,
        at: deps.now().toISOString(),
      },
      transaction,
    });
    return toPlateFile(row);
  });
}

/** The bytes of a picture of this problem; null when it has none of that name. */
export async function findPicture(deps: FileDeps, problemId: string, sha: string): Promise<Buffer | null> {
  const row = await deps.database.models.files.findOne({ where: { problemId, sha }, attributes: ['sha'] });
  return row ? readFile(placeOf(deps, sha)) : null;
}

/** The bytes of those of these pictures that the problem has, by fingerprint. */
export async function readPictures(
  deps: FileDeps,
  problemId: string,
  shas: readonly string[],
): Promise<Map<string, Uint8Array>> {
  const pictures = new Map<string, Uint8Array>();
  for (const sha of shas) {
    const bytes = await findPicture(deps, problemId, sha);
    if (bytes) pictures.set(sha, bytes);
  }
  return pictures;
}

/** What is known of those of these pictures that the problem has, in the order of their fingerprints. */
export async function listPictures(
  database: Database,
  problemId: string,
  shas: readonly string[],
): Promise<PlateFile[]> {
  const rows = await database.models.files.findAll({
    where: { problemId, sha: [...shas] },
    order: [['sha', 'ASC']],
  });
  return rows.map(toPlateFile);
}

function placeOf({ environment }: FileDeps, sha: string): string {
  return path.join(environment.dataFolder, 'files', sha.slice(0, 2), `${sha}.jpg`);
}

/** Written beside and moved into place, so that a crash never leaves half a picture under a whole name. */
async function writeOnce(place: string, data: Buffer): Promise<void> {
  await mkdir(path.dirname(place), { recursive: true });
  const beside = `${place}.${process.pid}.${Date.now()}`;
  await writeFile(beside, data);
  await rename(beside, place);
}
