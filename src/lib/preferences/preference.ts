import { createStore, type Store } from '#src/lib/store/create-store.ts';

/** A choice kept in this browser. Where storage is refused, it lasts as long as the page. */
export interface Preference<T extends string> extends Store<T> {
  readonly name: string;
}

export function createPreference<T extends string>(
  name: string,
  choices: readonly T[],
  fallback: T,
): Preference<T> {
  const store = createStore<T>(readChoice(name, choices) ?? fallback);
  return {
    ...store,
    name,
    set(next) {
      keep(name, next);
      store.set(next);
    },
  };
}

function readChoice<T extends string>(name: string, choices: readonly T[]): T | null {
  const kept = recall(name);
  return choices.find((choice) => choice === kept) ?? null;
}

export function recall(name: string): string | null {
  try {
    return localStorage.getItem(`holdwater:${name}`);
  } catch {
    return null;
  }
}

export function keep(name: string, value: string): void {
  try {
    localStorage.setItem(`holdwater:${name}`, value);
  } catch {
    // Storage is refused or full: the choice lasts as long as the page.
  }
}
