import { mkdir, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { createTransport } from 'nodemailer';

export interface OutgoingMail {
  readonly id: string;
  readonly writtenAt: string;
  readonly to: { readonly name: string; readonly address: string };
  readonly subject: string;
  readonly text: string;
}

/** How mail leaves this machine, or is laid down on it. */
export interface MailTransport {
  /** Rejects when the mail was not taken. */
  send(mail: OutgoingMail): Promise<void>;
  close(): void;
}

export interface TransportOptions {
  /** Address of the mail server with the sign-in to it; null: files below the data folder. */
  readonly smtpUrl: string | null;
  readonly dataFolder: string;
  readonly from: string;
}

const PATIENCE = { connectionTimeout: 10_000, greetingTimeout: 10_000, socketTimeout: 20_000 };

/** Sends by SMTP where a server is named, and writes one .eml file a mail to `<data>/mail` where none is. */
export function createMailTransport({ smtpUrl, dataFolder, from }: TransportOptions): MailTransport {
  return smtpUrl === null ? fileTransport(join(dataFolder, 'mail'), from) : smtpTransport(smtpUrl, from);
}

function smtpTransport(url: string, from: string): MailTransport {
  const transporter = createTransport({ url, ...PATIENCE });
  return {
    send: async (mail) => void (await transporter.sendMail(toMessage(mail, from))),
    close: () => transporter.close(),
  };
}

function fileTransport(folder: string, from: string): MailTransport {
  const transporter = createTransport({ streamTransport: true, buffer: true, newline: 'windows' });
  return {
    async send(mail) {
      const { message } = await transporter.sendMail(toMessage(mail, from));
      await mkdir(folder, { recursive: true, mode: 0o700 });
      const name = `${mail.writtenAt.replaceAll(/[:.]/g, '-')}-${mail.id}.eml`;
      await writeFile(join(folder, name), message as Buffer, { mode: 0o600 });
    },
    close: () => transporter.close(),
  };
}

function toMessage({ id, writtenAt, to, subject, text }: OutgoingMail, from: string) {
  return {
    from,
    to,
    subject,
    text,
    date: new Date(writtenAt),
    // The same for every try, so that a mail which was taken twice is shown once.
    messageId: `<${id}@holdwater>`,
    headers: { 'Auto-Submitted': 'auto-generated' },
    // A text holds nothing but text: no file and no address is ever read to fill it.
    disableFileAccess: true,
    disableUrlAccess: true,
  };
}
