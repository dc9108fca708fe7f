import type { Evidence, Reading } from '#shared/evidence/evidence.ts';
import { settingWords } from '#shared/report/setting-words.ts';

/** Names one setting among others. */
export type SettingNamer = (settings: Readonly<Record<string, Reading>>) => string;

/**
 * Names settings by what differs among them: where one head is held through all, a lean alone names the place.
 *
 * @param all - every setting that is named beside the others
 * @param evidence - for symbols
 */
export function settingNamer(
  all: readonly Readonly<Record<string, Reading>>[],
  evidence: Evidence,
): SettingNamer {
  const values = new Map<string, Set<string>>();
  for (const settings of all) {
    for (const [id, { text, unit }] of Object.entries(settings)) {
      values.set(id, (values.get(id) ?? new Set()).add(`${text} ${unit}`));
    }
  }
  const varying = new Set([...values].filter(([, seen]) => seen.size > 1).map(([id]) => id));
  return (settings) => {
    const telling = Object.entries(settings).filter(([id]) => varying.size === 0 || varying.has(id));
    return settingWords(Object.fromEntries(telling), evidence);
  };
}
