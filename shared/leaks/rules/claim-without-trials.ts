import { nodesOf } from '#shared/report/document-text.ts';
import type { SectionName } from '#shared/report/schema/section-type.ts';
import { sectionOf } from '../section-of.ts';
import type { LeakGround, LeakRule } from '../leak.ts';

/** A claim that no kept trial stands behind, or whose test is not chosen: pressure 6 + 0.7 for each place that rests on it. */
export const claimWithoutTrials: LeakRule = {
  name: 'A claim without trials',
  code: 'claim',
  find: (ground) =>
    ground.evidence.claims.flatMap((claim) => {
      const finding = ground.findings.claims.get(claim.id);
      const isBare = claim.test === null || (finding !== undefined && finding.trials.length === 0);
      if (!isBare) return [];
      const because =
        claim.test === null ? (claim.openBecause ?? 'its test is not chosen') : (finding?.sentence ?? '');
      return [
        {
          about: [claim.id],
          section: sectionOfClaim(ground, claim.id),
          question: `You claim: “${withoutStop(claim.text)}”. Which trials show it?`,
          evidence: `No trial stands behind claim ${claim.n}: ${withoutStop(because)}.`,
          mend: 'Log trials that decide it and choose its test, or take the claim out.',
          place: { kind: 'claim', id: claim.id },
          pressure: 6 + 0.7 * usesOf(ground, claim.id),
        },
      ];
    }),
};

function sectionOfClaim({ document }: LeakGround, claim: string): SectionName {
  return sectionOf(document, (node) => node.type === 'claim' && node.attrs.claim === claim) ?? 'Conclusion';
}

function usesOf({ document }: LeakGround, claim: string): number {
  return [...nodesOf(document)].filter((node) => node.type === 'claim' && node.attrs.claim === claim).length;
}

function withoutStop(text: string): string {
  return text.replace(/[.?!]$/u, '');
}
