import type { ClientEvent, ServerEvent } from '#shared/contracts/evidence-changes.ts';
import { createStore, type Store } from '#src/lib/store/create-store.ts';

/** 'waiting' before the first try; 'down' while the server cannot be reached. */
export type StreamState = 'waiting' | 'open' | 'down';

export interface EventStream {
  readonly state: Store<StreamState>;
  /** Messages in the order in which they came. */
  onEvent(listener: (event: ServerEvent) => void): () => void;
  /** After every connection but the first: something may have been missed. */
  onReturn(listener: () => void): () => void;
  /** What this tab has open; told again after every reconnection. */
  say(event: ClientEvent): void;
  open(): void;
  close(): void;
}

export interface StreamSettings {
  readonly address: string;
  /** Asked when a connection could not be made: it may be that the session has ended. */
  readonly checkSession: () => Promise<void>;
}

const FIRST_PAUSE_MS = 500;
const LONGEST_PAUSE_MS = 10_000;
/** A connection that ends sooner was refused, not lost: the pause goes on growing. */
const LASTING_MS = 2_000;

/** One socket for each tab, connected again for as long as it is wanted. */
export function createEventStream({ address, checkSession }: StreamSettings): EventStream {
  const state = createStore<StreamState>('waiting');
  const eventListeners = new Set<(event: ServerEvent) => void>();
  const returnListeners = new Set<() => void>();
  let socket: WebSocket | null = null;
  let said: ClientEvent | null = null;
  let timer: ReturnType<typeof setTimeout> | null = null;
  let pause = FIRST_PAUSE_MS;
  let hasBeenOpen = false;
  let openedAt = 0;
  let isWanted = false;

  function connect(): void {
    timer = null;
    const attempt = new WebSocket(address);
    socket = attempt;
    attempt.addEventListener('open', () => {
      openedAt = performance.now();
      state.set('open');
      if (said) attempt.send(JSON.stringify(said));
      if (hasBeenOpen) for (const listener of [...returnListeners]) listener();
      hasBeenOpen = true;
    });
    attempt.addEventListener('message', (message) => {
      const event = parseServerEvent(message.data);
      if (event) for (const listener of [...eventListeners]) listener(event);
    });
    attempt.addEventListener('close', () => {
      if (socket === attempt) void lost();
    });
  }

  async function lost(): Promise<void> {
    socket = null;
    if (!isWanted) return;
    state.set('down');
    if (openedAt > 0 && performance.now() - openedAt > LASTING_MS) pause = FIRST_PAUSE_MS;
    openedAt = 0;
    await checkSession().catch(() => undefined);
    if (isWanted && !socket && timer === null) timer = setTimeout(connect, pause);
    pause = Math.min(pause * 2, LONGEST_PAUSE_MS);
  }

  return {
    state,
    onEvent: (listener) => added(eventListeners, listener),
    onReturn: (listener) => added(returnListeners, listener),
    say(event) {
      said = event;
      if (socket?.readyState === WebSocket.OPEN) socket.send(JSON.stringify(event));
    },
    open() {
      isWanted = true;
      if (!socket && timer === null) connect();
    },
    close() {
      isWanted = false;
      if (timer !== null) clearTimeout(timer);
      timer = null;
      const open = socket;
      socket = null;
      open?.close();
      state.set('waiting');
    },
  };
}

function added<T>(set: Set<T>, item: T): () => void {
  set.add(item);
  return () => set.delete(item);
}

function parseServerEvent(data: unknown): ServerEvent | null {
  if (typeof data !== 'string') return null;
  try {
    const event: unknown = JSON.parse(data);
    return typeof event === 'object' && event !== null && 'type' in event ? (event as ServerEvent) : null;
  } catch {
    return null;
  }
}
