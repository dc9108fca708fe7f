/** Fakes the network for client tests: `fetch` answers from a table, the event stream is a socket that tests speak through. */
import { vi } from 'vitest';
import type { ServerEvent } from '#shared/contracts/evidence-changes.ts';

export interface Asked {
  readonly method: string;
  readonly path: string;
  readonly headers: Headers;
  readonly body: unknown;
}

type Answer = Response | Promise<Response>;
type Handler = (asked: Asked) => Answer;

export interface FakeServer {
  /** Answers `GET /api/team` from now on; the last word for a place counts. */
  readonly on: {
    (place: string, handler: Handler): void;
    (place: string, body: object): void;
  };
  /** What was asked of a place, in order. */
  asked(place: string): readonly Asked[];
  /** As if the network were gone. */
  setReachable(isReachable: boolean): void;
  /** The sockets that were opened. */
  readonly sockets: FakeSocket[];
}

export function json(body: unknown, status = 200): Response {
  return new Response(body === undefined ? null : JSON.stringify(body), {
    status,
    headers: { 'content-type': 'application/json' },
  });
}

export function refusal(
  status: number,
  code: string,
  detail: string,
  fields?: Readonly<Record<string, string>>,
): Response {
  const body = { type: 'about:blank', title: code, status, code, detail, requestId: 'r-1', fields };
  return new Response(JSON.stringify(body), {
    status,
    headers: { 'content-type': 'application/problem+json' },
  });
}

export function noContent(): Response {
  return new Response(null, { status: 204 });
}

/** A socket whose other end is the test. */
export class FakeSocket extends EventTarget {
  static readonly OPEN = 1;
  readonly sent: unknown[] = [];
  readyState = 0;
  readonly url: string;

  constructor(url: string) {
    super();
    this.url = url;
  }

  send(text: string): void {
    this.sent.push(JSON.parse(text));
  }

  close(): void {
    this.readyState = 3;
  }

  opens(): void {
    this.readyState = FakeSocket.OPEN;
    this.dispatchEvent(new Event('open'));
  }

  says(event: ServerEvent): void {
    this.dispatchEvent(new MessageEvent('message', { data: JSON.stringify(event) }));
  }

  breaks(): void {
    this.readyState = 3;
    this.dispatchEvent(new CloseEvent('close'));
  }
}

/** Takes the place of fetch and WebSocket until the test ends (call vi.unstubAllGlobals afterwards). */
export function fakeServer(): FakeServer {
  const answers = new Map<string, Handler>();
  const all: { place: string; asked: Asked }[] = [];
  const sockets: FakeSocket[] = [];
  let isReachable = true;

  const fetchFake = async (input: string, init: RequestInit = {}): Promise<Response> => {
    const method = init.method ?? 'GET';
    const place = `${method} ${input}`;
    const body = typeof init.body === 'string' ? (JSON.parse(init.body) as unknown) : init.body;
    const asked = { method, path: input, headers: new Headers(init.headers), body };
    all.push({ place, asked });
    if (!isReachable) throw new TypeError('Failed to fetch');
    const handler = answers.get(place);
    if (!handler) return refusal(404, 'not-found', `Nothing answers ${place}.`);
    return handler(asked);
  };

  vi.stubGlobal('fetch', fetchFake);
  vi.stubGlobal(
    'WebSocket',
    class extends FakeSocket {
      constructor(url: string) {
        super(url);
        sockets.push(this);
      }
    },
  );

  const server: FakeServer = {
    on(place: string, answer: Handler | object) {
      answers.set(place, isHandler(answer) ? answer : () => json(answer));
    },
    asked: (place) => all.filter((entry) => entry.place === place).map(({ asked }) => asked),
    setReachable(next) {
      isReachable = next;
    },
    sockets,
  };
  server.on('GET /api/csrf', { token: 'token-1' });
  return server;
}

function isHandler(answer: Handler | object): answer is Handler {
  return typeof answer === 'function';
}
