import { findValue } from '#shared/evidence/find-value.ts';
import { countInWords, listInWords, startSentence } from '#shared/evidence/words.ts';
import { nodesOf } from '#shared/report/document-text.ts';
import { findSection } from '#shared/report/schema/section-type.ts';
import { settingNames, untiedNumbers } from '#shared/report/untied-numbers.ts';
import type { LeakRule } from '../leak.ts';

/** Numbers quoted one by one; beyond, the first stand for all. */
const QUOTED = 3;

/** Numbers typed by hand, or tied to something that is gone: pressure 2 + 0.5 for each. One leak for each section. */
export const notTied: LeakRule = {
  name: 'Not tied',
  code: 'tied',
  find: ({ evidence, findings, document }) => {
    const settings = settingNames(evidence);
    return document.content.flatMap((node) => {
      const section = findSection(node.type);
      if (!section) return [];
      const texts = [...nodesOf(node)].flatMap((child) => {
        if (child.type === 'text') return untiedNumbers(child.text, settings).map(({ text }) => text);
        const isBroken =
          child.type === 'liveValue' && findValue(findings, evidence, child.attrs.ref).shape === 'fault';
        return isBroken ? [child.attrs.shown ?? 'a number'] : [];
      });
      if (texts.length === 0) return [];
      const quoted = listInWords(texts.slice(0, QUOTED));
      const which = texts.length > QUOTED ? `${quoted} and others` : quoted;
      return [
        {
          about: [section.name],
          section: section.name,
          question: `Where does ${texts.length === 1 ? quoted : `your ${texts[0] ?? ''}`} come from?`,
          evidence: `${startSentence(countInWords(texts.length))} ${texts.length === 1 ? 'number' : 'numbers'} of ${section.name} ${texts.length === 1 ? 'follows' : 'follow'} no trial: ${which}.`,
          mend: 'Tie each to its trials with the symbol and ±, or take it out.',
          place: { kind: 'section', section: section.name },
          pressure: 2 + 0.5 * texts.length,
        },
      ];
    });
  },
};
