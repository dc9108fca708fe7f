import { describe, expect, test } from 'vitest';
import { evaluate } from '#shared/evidence/evaluate.ts';
import {
  comparisonDraft,
  comparisonDraftSchema,
  toComparisonBody,
} from '#src/features/model/view/comparison-draft.ts';
import { budgetRows } from '#src/features/model/view/budget-view.ts';
import { equationView, unitsSentence } from '#src/features/model/view/equation-view.ts';
import { modelDraft, modelDraftSchema, toModelBody } from '#src/features/model/view/model-draft.ts';
import { trustedSentences } from '#src/features/model/view/trusted-view.ts';
import { leaningSpoutEvidence } from '#server/database/seeders/demo/leaning-spout-evidence.ts';

const evidence = leaningSpoutEvidence(new Date('2026-03-03T12:00:00Z'));
const findings = evaluate(evidence);
const model = evidence.models.find(({ n }) => n === 3);
const lean = evidence.comparisons.find(({ free }) => free.length === 0);
if (!model || !lean) throw new Error('the demonstration has no model 3 or no prediction');

describe('a model', () => {
  test('opened as a form and kept unchanged: is the same model', () => {
    const body = toModelBody(modelDraft(model, evidence), evidence);

    expect(body.equations).toEqual(model.equations);
    expect(body.limits).toEqual(model.limits);
    expect(body.output).toBe(model.output);
  });

  test('its equations: units agree, and the sentence names the unit', () => {
    const views = model.equations.map(({ defines, expr }) => equationView(defines, expr, evidence));

    expect(views.every(({ fault }) => fault === null)).toBe(true);
    expect(unitsSentence(model, views)).toBe('Units agree, cm on both sides.');
  });

  test('with a symbol that nobody knows: the form says which, in its own field', () => {
    const draft = { ...modelDraft(model, evidence), equations: [{ defines: model.output, expr: 'Q*h' }] };
    const parsed = modelDraftSchema(evidence).safeParse(draft);

    expect(parsed.error?.issues.map(({ path }) => path.join('.'))).toContain('equations.0.expr');
    expect(parsed.error?.issues[0]?.message).toContain('Q');
  });

  test('where it is trusted: said in sentences', () => {
    const [where = ''] = trustedSentences(model, evidence);

    expect(where).toMatch(/^Where the .*4 to 20\u00a0cm/);
  });

  test('the budget at 38°: every source has words, and the shares make the whole', () => {
    const points = findings.comparisons.get(lean.id)?.points ?? [];
    const predicted = points.find(({ z }) => z !== null && z < -2)?.predicted;
    const rows = predicted ? budgetRows(predicted, evidence, findings) : [];

    expect(rows.reduce((sum, { share }) => sum + share, 0)).toBeCloseTo(1, 10);
    expect(rows.map(({ words }) => words).filter((words) => /gone|not named/.test(words))).toEqual([]);
    expect(rows[0]?.quantity?.symbol).toBe('C_v');
  });
});

describe('a comparison', () => {
  test('opened as a form and kept unchanged: is the same comparison', () => {
    for (const comparison of evidence.comparisons) {
      const { id, ...rest } = comparison;
      expect([id, toComparisonBody(comparisonDraft(comparison, evidence), rest.model, evidence)]).toEqual([
        id,
        rest,
      ]);
    }
  });

  test('with a trial that does not exist: names it', () => {
    const draft = { ...comparisonDraft(lean, evidence), plusTrials: 'A1, Z9' };

    expect(comparisonDraftSchema(evidence).safeParse(draft).error?.issues[0]?.message).toBe(
      'There is no trial Z9.',
    );
  });
});
