import { nodesOf } from '#shared/report/document-text.ts';
import { sectionOf } from '../section-of.ts';
import type { LeakGround, LeakRule } from '../leak.ts';

/** An effect that the newest model leaves out without an estimate of its size: pressure 2 + 0.3 for each mention. */
export const conditionNotChecked: LeakRule = {
  name: 'A condition not checked',
  code: 'condition',
  find: (ground) => {
    const model = ground.evidence.models.reduce<(typeof ground.evidence.models)[number] | null>(
      (newest, next) => (newest === null || next.n > newest.n ? next : newest),
      null,
    );
    if (model === null) return [];
    return model.assumptions.flatMap(({ text, neglects, size }) => {
      if (neglects === undefined || (size !== undefined && size.trim() !== '')) return [];
      return [
        {
          about: [model.id, neglects],
          section: sectionOf(ground.document, (node) => mentions(node, neglects)) ?? 'Model',
          question: `You leave out ${neglects}. How do you know it is small?`,
          evidence: `Model ${model.n} assumes: ${withoutStop(text)}. The size of ${neglects} is not estimated.`,
          mend: `Estimate how much ${neglects} would change, beside the uncertainty, in the model’s assumptions.`,
          place: { kind: 'model', id: model.id },
          pressure: 2 + 0.3 * countMentions(ground, neglects),
        },
      ];
    });
  },
};

function mentions(node: { readonly type: string }, effect: string): boolean {
  return (
    node.type === 'text' &&
    (node as { text?: string }).text?.toLowerCase().includes(effect.toLowerCase()) === true
  );
}

function countMentions({ document }: LeakGround, effect: string): number {
  return [...nodesOf(document)].filter((node) => mentions(node, effect)).length;
}

function withoutStop(text: string): string {
  return text.replace(/\.$/u, '');
}
