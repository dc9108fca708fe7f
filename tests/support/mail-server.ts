/** A mail server on this machine that speaks real SMTP and keeps what it takes. */
import type { AddressInfo } from 'node:net';
import { SMTPServer } from 'smtp-server';

export interface TestMailServer {
  readonly url: string;
  /** Whole mails with their headers. */
  readonly taken: readonly string[];
  /** Refuses every recipient with this code; null: takes them. */
  refuseWith(code: number | null): void;
  stop(): Promise<void>;
}

export async function startMailServer(port = 0): Promise<TestMailServer> {
  const taken: string[] = [];
  let refusal: number | null = null;
  const server = new SMTPServer({
    authOptional: true,
    disabledCommands: ['STARTTLS'],
    onRcptTo: (_address, _session, done) =>
      done(refusal === null ? null : Object.assign(new Error('no'), { responseCode: refusal })),
    onData(stream, _session, done) {
      let mail = '';
      stream.on('data', (chunk) => (mail += chunk));
      stream.on('end', () => {
        taken.push(mail);
        done();
      });
    },
  });
  await new Promise<void>((resolve) => server.listen(port, '127.0.0.1', () => resolve()));
  return {
    url: `smtp://127.0.0.1:${(server.server.address() as AddressInfo).port}`,
    taken,
    refuseWith: (code) => {
      refusal = code;
    },
    stop: () => new Promise((resolve) => server.close(() => resolve())),
  };
}
