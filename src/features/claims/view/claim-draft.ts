import { z } from 'zod';
import type { claimBody } from '#shared/contracts/evidence.ts';
import {
  valueReferenceSchema,
  type Claim,
  type ClaimTest,
  type Evidence,
  type ValueReference,
} from '#shared/evidence/evidence.ts';
import { parseTypedNumber } from '#shared/units/typed-number.ts';

export const TESTS = {
  none: 'not chosen yet',
  equals: 'a value equals another',
  'model fits': 'a model fits its trials',
  bound: 'a value stays on one side of a limit',
} as const;
export type TestKind = keyof typeof TESTS;

/** The form of a claim, as typed and chosen. */
export interface ClaimDraft {
  text: string;
  test: TestKind;
  openBecause: string;
  /** equals: the measured side; bound: the value. */
  measured: ValueReference | null;
  expected: ValueReference | null;
  comparison: string;
  side: 'at most' | 'at least';
  limit: string;
}

export type ClaimBody = z.infer<typeof claimBody>;

export function claimDraft(claim: Claim | null): ClaimDraft {
  const test = claim?.test ?? null;
  return {
    text: claim?.text ?? '',
    test: test?.kind ?? 'none',
    openBecause: claim?.openBecause ?? '',
    measured: test?.kind === 'equals' ? test.measured : test?.kind === 'bound' ? test.value : null,
    expected: test?.kind === 'equals' ? test.expected : null,
    comparison: test?.kind === 'model fits' ? test.comparison : '',
    side: test?.kind === 'bound' ? test.side : 'at most',
    limit:
      test?.kind === 'bound'
        ? `${test.limit.text}${test.limit.unit === '1' ? '' : ` ${test.limit.unit}`}`
        : '',
  };
}

export const claimDraftSchema = z
  .object({
    text: z.string().trim().min(1, 'Write the sentence that you would defend.').max(400),
    test: z.enum(Object.keys(TESTS) as [TestKind, ...TestKind[]]),
    openBecause: z.string().trim().max(400),
    measured: valueReferenceSchema.nullable(),
    expected: valueReferenceSchema.nullable(),
    comparison: z.string(),
    side: z.enum(['at most', 'at least']),
    limit: z.string().trim(),
  })
  .superRefine((draft, context) => {
    const refuse = (path: keyof ClaimDraft, message: string) =>
      context.addIssue({ code: 'custom', path: [path], message });
    if (draft.test === 'equals' || draft.test === 'bound') {
      if (!draft.measured) refuse('measured', 'Choose the value that carries the claim.');
    }
    if (draft.test === 'equals' && !draft.expected) refuse('expected', 'Choose what it must equal.');
    if (draft.test === 'model fits' && draft.comparison === '')
      refuse('comparison', 'Choose the comparison.');
    if (draft.test === 'bound') {
      const parsed = parseTypedNumber(draft.limit, '1');
      if (!parsed.ok) refuse('limit', parsed.sentence);
    }
  });

/** The row to send; call it with a draft that the schema has passed. */
export function toClaimBody(draft: ClaimDraft, before: Claim | null, evidence: Evidence): ClaimBody {
  return {
    text: draft.text.trim(),
    test: testOf(draft, evidence),
    openBecause: draft.test === 'none' ? draft.openBecause.trim() || undefined : undefined,
    task: before?.task,
  };
}

function testOf(draft: ClaimDraft, evidence: Evidence): ClaimTest | null {
  switch (draft.test) {
    case 'none':
      return null;
    case 'equals':
      return draft.measured && draft.expected
        ? { kind: 'equals', measured: draft.measured, expected: draft.expected }
        : null;
    case 'model fits':
      return { kind: 'model fits', comparison: draft.comparison };
    case 'bound': {
      const parsed = parseTypedNumber(draft.limit, unitOfReference(draft.measured, evidence));
      return draft.measured && parsed.ok
        ? { kind: 'bound', value: draft.measured, side: draft.side, limit: parsed.reading }
        : null;
    }
  }
}

/** A limit typed without a unit is in the unit of the value. */
function unitOfReference(reference: ValueReference | null, evidence: Evidence): string {
  const id = reference && 'quantity' in reference ? reference.quantity : undefined;
  return evidence.quantities.find((quantity) => quantity.id === id)?.unit ?? '1';
}
