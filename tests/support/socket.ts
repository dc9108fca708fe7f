/** A socket as a browser opens it: with cookies and, unless told otherwise, from our own page. */
import WebSocket from 'ws';

export interface TestSocket {
  /** Everything the server said so far, parsed. */
  readonly messages: readonly Record<string, unknown>[];
  /** The next message that fits, those already here included. */
  next(fits: (message: Record<string, unknown>) => boolean): Promise<Record<string, unknown>>;
  send(message: unknown): void;
  isOpen(): boolean;
  /** The code it was closed with. */
  readonly closed: Promise<number>;
  close(): void;
}

export async function openSocket(
  url: string,
  path: string,
  cookie: string,
  origin: string = url,
): Promise<TestSocket> {
  const socket = new WebSocket(url.replace('http', 'ws') + path, { headers: { cookie }, origin });
  const messages: Record<string, unknown>[] = [];
  const waiting = new Set<() => void>();
  socket.on('message', (data) => {
    messages.push(JSON.parse(String(data)) as Record<string, unknown>);
    for (const look of waiting) look();
  });
  const closed = new Promise<number>((resolve) => socket.once('close', resolve));
  await new Promise<void>((resolve, reject) => {
    socket.once('open', () => resolve());
    socket.once('error', reject);
  });
  return {
    messages,
    closed,
    next: (fits) =>
      new Promise((resolve, reject) => {
        const limit = setTimeout(
          () => reject(new Error(`No such message in 5 s, only ${JSON.stringify(messages)}`)),
          5000,
        );
        const look = () => {
          const found = messages.find(fits);
          if (!found) return;
          clearTimeout(limit);
          waiting.delete(look);
          resolve(found);
        };
        waiting.add(look);
        look();
      }),
    send: (message) => socket.send(typeof message === 'string' ? message : JSON.stringify(message)),
    isOpen: () => socket.readyState === WebSocket.OPEN,
    close: () => socket.close(),
  };
}

/** Status with which the upgrade to a socket is refused. */
export function refusedSocket(
  url: string,
  path: string,
  cookie: string,
  origin: string = url,
): Promise<number> {
  const socket = new WebSocket(url.replace('http', 'ws') + path, { headers: { cookie }, origin });
  return new Promise((resolve, reject) => {
    socket.once('unexpected-response', (_request, response) => {
      resolve(response.statusCode ?? 0);
      socket.terminate();
    });
    socket.once('open', () => reject(new Error('The socket was accepted.')));
    socket.on('error', () => undefined);
  });
}
