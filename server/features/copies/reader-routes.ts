import type { Express } from 'express';
import {
  getCopyFile,
  getCopyPdf as getCopyPdfEndpoint,
  getCopyStanding,
  openCopy as openCopyEndpoint,
  passCopy as passCopyEndpoint,
} from '#shared/contracts/copies.ts';
import type { ServerDeps } from '#server/deps.ts';
import { mountOpen, type MountOptions } from '#server/middleware/mount.ts';
import { sendPdf } from '#server/middleware/send-pdf.ts';
import { getCopyPdf, getCopyPicture, getStanding, openCopy, passCopy } from './read-copy.ts';
import { keepPass, visitorOf } from './visitor.ts';

/** What a reader does with a copy; nobody needs an account. */
export function mountCopyReading(app: Express, deps: ServerDeps, guarded: MountOptions): void {
  mountOpen(app, openCopyEndpoint, ({ request }) => openCopy(deps, visitorOf(request)), guarded);

  mountOpen(
    app,
    passCopyEndpoint,
    async ({ request, response, body }) => {
      const pass = await passCopy(deps, visitorOf(request), body.passphrase);
      if (pass !== null) keepPass(request, response, 'opening', pass);
    },
    guarded,
  );

  mountOpen(app, getCopyStanding, ({ request }) => getStanding(deps, visitorOf(request)), guarded);

  mountOpen(
    app,
    getCopyFile,
    async ({ request, response, param }) => {
      const bytes = await getCopyPicture(deps, visitorOf(request), param('sha'));
      response.setHeader('content-type', 'image/jpeg');
      response.setHeader('content-disposition', 'inline');
      response.status(200).end(Buffer.from(bytes));
    },
    guarded,
  );

  mountOpen(
    app,
    getCopyPdfEndpoint,
    async ({ request, response }) => sendPdf(response, await getCopyPdf(deps, visitorOf(request))),
    guarded,
  );
}
