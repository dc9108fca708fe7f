import { existsSync, readFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';

/** Stands in a kept text where the link goes, so that whoever reads the text does not hold what the link opens. */
export const LINK_PLACE = '[the link]';

export interface ComposedMail {
  readonly subject: string;
  readonly text: string;
}

/** Fills a message of templates/mail: the first line is its subject. A word without a value is a mistake and throws. */
export function composeMail(
  template: 'invitation' | 'reset',
  values: Readonly<Record<string, string>>,
): ComposedMail {
  const [subject = '', ...lines] = readFileSync(join(templateFolder(), `${template}.txt`), 'utf8').split(
    '\n',
  );
  const fill = (text: string) =>
    text.replaceAll(/\{(\w+)\}/g, (_all, word: string) => {
      const value = word === 'link' ? LINK_PLACE : values[word];
      if (value === undefined) throw new RangeError(`composeMail: ${template} needs a value for ${word}`);
      return value;
    });
  return { subject: fill(subject), text: fill(lines.join('\n').trim()) };
}

/** Above this file, wherever it was bundled to. */
function templateFolder(): string {
  for (let folder = dirname(fileURLToPath(import.meta.url)); ; folder = dirname(folder)) {
    const found = join(folder, 'templates', 'mail');
    if (existsSync(found)) return found;
    if (folder === dirname(folder)) throw new Error('The folder templates/mail is missing.');
  }
}
