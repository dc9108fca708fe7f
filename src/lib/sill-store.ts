import { createStore, type Store } from './store/create-store.ts';

/** One sentence of what has happened, with at most one action. */
export interface SillSentence {
  readonly id: number;
  readonly text: string;
  readonly action?: { readonly words: string; readonly run: () => void } | undefined;
}

export interface SillStore extends Store<SillSentence | null> {
  say(text: string, action?: SillSentence['action']): void;
  /** While it is pointed at or focused, the sentence stays. */
  hold(): void;
  release(): void;
}

const SENTENCE_MS = 8_000;

export function createSillStore(): SillStore {
  const sentence = createStore<SillSentence | null>(null);
  let timer: ReturnType<typeof setTimeout> | null = null;
  let next = 1;
  const stop = () => {
    if (timer !== null) clearTimeout(timer);
    timer = null;
  };
  const start = () => {
    stop();
    timer = setTimeout(() => sentence.set(null), SENTENCE_MS);
  };
  return {
    ...sentence,
    set(value) {
      stop();
      sentence.set(value);
    },
    say(text, action) {
      sentence.set({ id: next++, text, action });
      start();
    },
    hold: stop,
    release() {
      if (sentence.get()) start();
    },
  };
}

export const sillStore = createSillStore();

/** Says on the sill what has happened: `say('B20 logged. Mean at 45° is now 44.8 cm.', { words: 'Undo', run })`. */
export function say(text: string, action?: SillSentence['action']): void {
  sillStore.say(text, action);
}
