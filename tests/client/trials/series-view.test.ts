import { describe, expect, test } from 'vitest';
import { evaluate } from '#shared/evidence/evaluate.ts';
import { cautionsFor } from '#src/features/trials/cautions/cautions-for.ts';
import { deviation } from '#src/features/trials/view/deviation.ts';
import { seriesView } from '#src/features/trials/view/series-view.ts';
import { sharedScale } from '#src/features/trials/view/shared-scale.ts';
import { fallingCupsEvidence } from '#server/database/seeders/demo/falling-cups-evidence.ts';
import { leaningSpoutEvidence } from '#server/database/seeders/demo/leaning-spout-evidence.ts';

const start = new Date('2026-03-03T12:00:00Z');
const evidence = leaningSpoutEvidence(start);
const findings = evaluate(evidence);
const b = evidence.series.find(({ letter }) => letter === 'B');
if (!b) throw new Error('the demonstration has no series B');
const view = seriesView(b, evidence, findings);
const plain = (text: string) => text.replaceAll('\u00a0', ' ');

describe('a series on the Trials screen', () => {
  test('series B: its leans in order, with the two upright trials of series A before them', () => {
    const leans = view.groups.map((group) => group.settings[b.settings[0] ?? '']?.text);

    expect(leans).toEqual(['0.0', '10', '20', '30', '38', '45', '55']);
    expect(view.groups[0]?.isBorrowed).toBe(true);
    expect(view.groups[0]?.lines.map(({ name }) => name)).toEqual(['A1', 'A2']);
  });

  test('the setting at 38°: mean and z stand once, and B11 is there although it is excluded', () => {
    const group = view.groups[4];

    expect(group?.z).toBeCloseTo(-2.28, 2);
    expect(group?.lines.map(({ name }) => name)).toEqual(['B10', 'B11', 'B12', 'B13']);
  });

  test('the shared scale: every bar and the prediction lie on it, with round ticks', () => {
    const scale = sharedScale(view.groups, 2, (si) => si * 100);

    expect(scale?.ticks.map(({ label }) => label)).toEqual(['30', '35', '40', '45', '50']);
    expect(scale?.share(0.464)).toBeGreaterThan(0);
    expect(scale?.share(0.464)).toBeLessThan(1);
  });

  test('a reading that is not logged yet: told against the prediction and its company', () => {
    const [theta = ''] = b.settings;
    const told = deviation(evidence, findings, b, view, {
      [theta]: { text: '45', unit: '°' },
      [view.drawn?.id ?? '']: { text: '44.7', unit: 'cm', u: '0.4' },
    });

    expect(
      told?.kind === 'predicted' && [plain(told.predicted), plain(told.away ?? ''), told.isBeyond, told.line],
    ).toEqual(['47.0 ± 0.7 cm', '2.3 cm short', true, 'In line with B14 to B16.']);
  });
});

describe('usual cautions', () => {
  test('cups dropped from above two metres: the card for heights comes up', () => {
    const cards = cautionsFor('Light paper cups are nested and dropped.', fallingCupsEvidence(start));

    expect(cards.map(({ hazard }) => hazard)).toContain('Work at height and drops from a height');
  });

  test('a task that hurts nobody: no card', () => {
    expect(cautionsFor('How does a coin spin?', { ...evidence, quantities: [], series: [] })).toEqual([]);
  });
});
