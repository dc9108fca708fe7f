import type { Express } from 'express';
import multer from 'multer';
import { getFile, MAX_UPLOAD_BYTES, uploadPlate } from '#shared/contracts/report.ts';
import type { ServerDeps } from '#server/deps.ts';
import { AppError } from '#server/errors/app-error.ts';
import { notFound } from '#server/errors/refusals.ts';
import { mountProblem } from '#server/middleware/mount.ts';
import { findPicture, keepPicture } from './service.ts';

const A_YEAR_S = 31_536_000;

export function mountFiles(app: Express, deps: ServerDeps): void {
  const upload = multer({
    storage: multer.memoryStorage(),
    limits: { fileSize: MAX_UPLOAD_BYTES, files: 1, fields: 4 },
  });

  mountProblem(
    app,
    deps.database,
    uploadPlate,
    'write',
    async ({ place, actor, request }) => {
      if (!request.file) {
        throw new AppError(422, 'no-file', 'No picture came along. Choose a file and try again.', {
          fields: { file: 'Choose a picture.' },
        });
      }
      return keepPicture(deps, place.problem.id, actor.id, request.file.buffer);
    },
    { before: [upload.single('file')] },
  );

  mountProblem(app, deps.database, getFile, 'read', async ({ place, param, response }) => {
    const sha = param('sha');
    const data = /^[0-9a-f]{64}$/.test(sha) ? await findPicture(deps, place.problem.id, sha) : null;
    if (!data) throw notFound();
    response.setHeader('content-type', 'image/jpeg');
    response.setHeader('cache-control', `private, max-age=${A_YEAR_S}, immutable`);
    response.setHeader('content-disposition', 'inline');
    response.send(data);
    return undefined;
  });
}
