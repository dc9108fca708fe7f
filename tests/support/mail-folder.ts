/** The mail that a server without a mail server has laid down in its data folder. */
import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';

/** Every mail so far with its lines joined again, the oldest first. */
export function readMailFolder(dataFolder: string): string[] {
  const folder = join(dataFolder, 'mail');
  if (!existsSync(folder)) return [];
  return readdirSync(folder)
    .sort()
    .map((name) => decode(readFileSync(join(folder, name), 'utf8')));
}

/** Path of the link in a mail, as /join/… */
export function linkIn(mail: string): string {
  const link = /https?:\/\/\S+/.exec(mail)?.[0];
  if (link === undefined) throw new RangeError(`linkIn: needs a mail with a link, got ${mail}`);
  return new URL(link).pathname;
}

/** Undoes quoted-printable, where the mail uses it. */
function decode(mail: string): string {
  if (!/content-transfer-encoding: quoted-printable/i.test(mail)) return mail;
  const bytes = mail
    .replaceAll(/=\r?\n/g, '')
    .replaceAll(/=([0-9A-F]{2})/g, (_all, hex: string) => String.fromCharCode(parseInt(hex, 16)));
  return Buffer.from(bytes, 'latin1').toString('utf8');
}
