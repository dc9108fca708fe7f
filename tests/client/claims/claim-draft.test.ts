import { describe, expect, test } from 'vitest';
import { claimDraft, claimDraftSchema, toClaimBody } from '#src/features/claims/view/claim-draft.ts';
import { leaningSpoutEvidence } from '#server/database/seeders/demo/leaning-spout-evidence.ts';

const evidence = leaningSpoutEvidence(new Date('2026-03-03T12:00:00Z'));

describe('a claim', () => {
  test.each(evidence.claims.map((claim) => [claim.n, claim] as const))(
    '%i opened as a form and kept unchanged: is the same claim',
    (_n, claim) => {
      const body = toClaimBody(claimDraft(claim), claim, evidence);

      expect(body.text).toBe(claim.text);
      expect(body.test).toEqual(claim.test);
    },
  );

  test('that equals something, with nothing chosen: both sides are asked for', () => {
    const parsed = claimDraftSchema.safeParse({ ...claimDraft(null), text: 'It is 46 cm.', test: 'equals' });

    expect(parsed.error?.issues.map(({ path }) => path[0])).toEqual(['measured', 'expected']);
  });

  test('of a bound typed without a unit: the limit is in the unit of the value', () => {
    const range = evidence.quantities.find(({ symbol }) => symbol === 'R_max');
    const draft = {
      ...claimDraft(null),
      text: 'It stays below half a metre.',
      test: 'bound' as const,
      measured: { kind: 'quantity' as const, quantity: range?.id ?? '' },
      limit: '50',
    };

    expect(toClaimBody(draft, null, evidence).test).toMatchObject({
      kind: 'bound',
      limit: { text: '50', unit: 'cm' },
    });
  });
});
