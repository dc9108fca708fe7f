import { keep, recall } from '#src/lib/preferences/preference.ts';

/** How each number of a report stood when it was last read in this browser, by this person. */
export interface ReadingMarks {
  /** null: it has not been read here yet. */
  lastRead(key: string): string | null;
  read(key: string, shown: string): void;
}

/** More numbers than a report holds; the oldest marks go first. */
const MOST = 2000;

/** @param name - of report and reader, so that two people at one browser do not read for each other */
export function readingMarks(name: string): ReadingMarks {
  const place = `read:${name}`;
  const marks = parseMarks(recall(place));
  return {
    lastRead: (key) => marks.get(key) ?? null,
    read(key, shown) {
      if (marks.get(key) === shown) return;
      marks.delete(key);
      marks.set(key, shown);
      for (const oldest of marks.keys()) {
        if (marks.size <= MOST) break;
        marks.delete(oldest);
      }
      keep(place, JSON.stringify([...marks]));
    },
  };
}

function parseMarks(kept: string | null): Map<string, string> {
  try {
    const entries: unknown = JSON.parse(kept ?? '[]');
    if (!Array.isArray(entries)) return new Map();
    return new Map(entries.filter(isEntry));
  } catch {
    return new Map();
  }
}

function isEntry(entry: unknown): entry is [string, string] {
  return Array.isArray(entry) && entry.length === 2 && entry.every((part) => typeof part === 'string');
}
