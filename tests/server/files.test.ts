import { readdirSync } from 'node:fs';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import sharp from 'sharp';
import request from 'supertest';
import { MAX_UPLOAD_BYTES } from '#shared/contracts/report.ts';
import { SPOUT, startTestServer, type SignedIn, type TestServer } from '#tests/support/server.ts';

let app: TestServer;
let kasimir: SignedIn;
beforeAll(async () => {
  app = await startTestServer();
  kasimir = await app.signIn('kasimir');
});
afterAll(() => app.stop());

const picture = (width: number, height: number) =>
  sharp({ create: { width, height, channels: 3, background: '#3a7ca5' } })
    .withExif({ IFD0: { Copyright: 'somebody', ImageDescription: 'bench 4' } })
    .png()
    .toBuffer();

const upload = (bytes: Buffer, name: string, who: SignedIn = kasimir) =>
  request(app.url)
    .post(`${SPOUT}/files`)
    .set('cookie', who.cookie)
    .set('x-csrf-token', who.token)
    .attach('file', bytes, name);

describe('plates', () => {
  test('when a large picture comes: it is encoded anew, smaller, without the camera’s notes', async () => {
    const answer = await upload(await picture(2400, 1200), 'rig.png');

    expect(answer.status).toBe(201);
    expect(answer.body).toMatchObject({ width: 1600, height: 800 });
    const file = await kasimir.get(`${SPOUT}/files/${answer.body.sha}`);
    expect(file.headers['content-type']).toBe('image/jpeg');
    expect(file.headers['cache-control']).toContain('immutable');
    const kept = await sharp(file.body as Buffer).metadata();
    expect(kept.format).toBe('jpeg');
    expect(kept.exif).toBeUndefined();
  });

  test('when the same picture comes twice: it is kept once', async () => {
    const bytes = await picture(300, 200);

    const [first, second] = [await upload(bytes, 'a.png'), await upload(bytes, 'b.png')];

    expect(second.body.sha).toBe(first.body.sha);
    const folder = join(app.dataFolder, 'files', String(first.body.sha).slice(0, 2));
    expect(readdirSync(folder)).toEqual([`${first.body.sha}.jpg`]);
  });

  test.each([
    ['text called a picture', Buffer.from('hello'), 'plate.png'],
    ['a document', Buffer.from('%PDF-1.7\n%\u00e2\u00e3\u00cf\u00d3\n1 0 obj\n'), 'plate.jpg'],
    ['half a picture', Buffer.from('89504e470d0a1a0a0000000d49484452', 'hex'), 'half.png'],
  ])('when %s comes: refuses with code not-a-picture', async (_what, bytes, name) => {
    const answer = await upload(bytes, name);

    expect(answer.status).toBe(415);
    expect(answer.body).toMatchObject({ code: 'not-a-picture' });
  });

  test('when a file is too large: refuses with code too-large before reading it all', async () => {
    const answer = await upload(Buffer.alloc(MAX_UPLOAD_BYTES + 1), 'huge.png');

    expect(answer.status).toBe(413);
    expect(answer.body).toMatchObject({ code: 'too-large' });
  });

  test('as an advisor: may look, and may not add', async () => {
    const odile = await app.signIn('odile');
    const { body } = await upload(await picture(40, 40), 'small.png');

    expect((await upload(await picture(41, 40), 'mine.png', odile)).status).toBe(403);
    expect((await odile.get(`${SPOUT}/files/${body.sha}`)).status).toBe(200);
  });

  test('of another problem or another team: does not exist', async () => {
    const sunniva = await app.signIn('sunniva');
    const { body } = await upload(await picture(42, 40), 'small.png');

    expect((await sunniva.get(`${SPOUT}/files/${body.sha}`)).status).toBe(404);
    expect((await kasimir.get(`/api/teams/tern-rock/problems/4/files/${body.sha}`)).status).toBe(404);
    expect((await kasimir.get(`${SPOUT}/files/..%2f..%2fholdwater.sqlite`)).status).toBe(404);
  });
});
