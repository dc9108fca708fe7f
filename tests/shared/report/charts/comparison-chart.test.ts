import { describe, expect, test } from 'vitest';
import { chartHeight } from '#shared/report/charts/chart-height.ts';
import { comparisonChart } from '#shared/report/charts/comparison-chart.ts';
import { chartSentence } from '#shared/report/charts/chart-sentence.ts';
import { comparisonScene } from '#shared/report/charts/comparison-scene.ts';
import { recordChart, THEME } from './recorded-chart.ts';
import { LEANS, SAMPLE_EVIDENCE, sampleFinding, samplePoint } from './sample-finding.ts';

const WIDE = { width: 612, height: 282 };
const NARROW = { width: 340, height: 306 };
const { settings } = SAMPLE_EVIDENCE;

const build = (finding = sampleFinding(), size = WIDE) =>
  comparisonChart(finding, SAMPLE_EVIDENCE, settings, THEME, size);
const draw = (finding = sampleFinding(), size = WIDE) => recordChart(build(finding, size), size);
const wordsOf = (finding = sampleFinding(), size = WIDE) => draw(finding, size).texts.map(({ text }) => text);

function dataset(label: string, finding = sampleFinding()) {
  const found = build(finding).data.datasets.find((one) => one.label === label);
  if (!found) throw new Error(`no dataset ${label}`);
  return found;
}

describe('comparisonScene', () => {
  const scene = comparisonScene(sampleFinding(), SAMPLE_EVIDENCE, settings);

  test('points in SI, when brought to the axes: stand in the units of the register with bars of k u', () => {
    const [, second] = scene.series[0]?.points ?? [];

    expect(second?.x).toBeCloseTo(10, 10);
    expect(second?.y).toBeCloseTo(36.3, 10);
    expect(second?.yBar).toBeCloseTo(0.7, 10);
    expect(second?.xBar).toBeCloseTo(1, 10);
  });

  test('curve, when trust ends on the way: is one trusted stretch and one outside that meet', () => {
    const [inside, outside] = scene.curve;

    expect(scene.curve.map((stretch) => stretch.trusted)).toEqual([true, false]);
    expect(inside?.x.at(-1)).toBeCloseTo(60, 8);
    expect(outside?.x[0]).toBeCloseTo(60, 8);
  });

  test('largest prediction, when it lies inside: is where tan θ = √(H/(H + y))', () => {
    const exact = (Math.atan(Math.sqrt(0.187 / (0.187 + 0.12))) * 180) / Math.PI;

    expect(scene.largest?.x).toBeCloseTo(exact, 2);
    expect(scene.largest?.y).toBeCloseTo(200 * Math.sqrt(0.187 * (0.187 + 0.12)), 5);
  });

  test('largest prediction, when the curve only rises: is not marked', () => {
    const { curve } = sampleFinding();
    const rising = curve && { ...curve, trusted: curve.trusted.map((_, i) => (i < 40 ? 1 : 0)) };

    expect(comparisonScene(sampleFinding({ curve: rising }), SAMPLE_EVIDENCE, settings).largest).toBeNull();
  });
});

describe('comparisonChart', () => {
  test('asked twice, when Chart.js has changed the first: gives a fresh one', () => {
    const first = build();
    recordChart(first, WIDE);

    expect(build().data.datasets).not.toBe(first.data.datasets);
    expect(wordsOf()).toEqual(wordsOf());
  });

  test('measured data, when hovered: name their point in the finding', () => {
    expect(dataset('measured B').data.map((datum) => (datum as { point?: number } | null)?.point)).toEqual([
      0, 1, 2, 3, 4, 5, 6,
    ]);
  });

  test('curve outside trust, when drawn: is dashed and has no band', () => {
    const labels = build().data.datasets.map((one) => one.label);

    expect(dataset('predicted, outside trust')).toMatchObject({ borderDash: [2, 3] });
    expect(labels.filter((label) => label === 'band')).toHaveLength(1);
  });

  test('band, when drawn: is k times u on each side of the curve', () => {
    const [curve, band] = [dataset('predicted').data[0], dataset('band').data[0]] as { y: number }[];

    expect((band?.y ?? NaN) - (curve?.y ?? NaN)).toBeCloseTo(1, 10);
  });

  test('a second series, when compared: has the next point form and its own label in the same hue', () => {
    const finding = sampleFinding({
      points: [...sampleFinding().points, ...LEANS.map((lean) => samplePoint(lean, 40, 0, 'C'))],
    });

    expect(dataset('measured C', finding)).toMatchObject({
      pointStyle: 'rect',
      pointBackgroundColor: THEME.water,
    });
    expect(wordsOf(finding).join('|')).toContain('|series C|');
  });

  test('axis titles, when drawn: stand at the ends, symbols in the report’s italic', () => {
    const { texts, area } = draw();
    const symbol = texts.find(({ text, font }) => text === 'R' && font.includes('STIX'));
    const lean = texts.find(({ text }) => text === 'lean ');
    const unit = texts.find(({ text }) => text === ' / °');

    expect(symbol).toMatchObject({ x: area.left });
    expect(symbol?.y).toBeLessThan(area.top);
    expect(lean?.y).toBeGreaterThan(area.bottom);
    expect(unit?.x).toBeGreaterThan(area.right - 40);
  });

  test('a figure under the bottom title, when drawn: gives way to it', () => {
    expect(wordsOf()).not.toContain('60');
    expect(wordsOf()).toEqual(expect.arrayContaining(['0', '10', '20', '30', '40', '50']));
  });

  test('labels, when there is room: stand at the curves in their hue, each once', () => {
    const { texts } = draw();

    expect(texts.find(({ text }) => text === 'predicted, ± ')).toMatchObject({ colour: THEME.copper });
    expect(texts.find(({ text }) => text === 'measured, mean ± ')).toMatchObject({ colour: THEME.water });
    expect(texts.find(({ text }) => text === 'B11 excluded')).toMatchObject({ colour: THEME.ink3 });
    expect(texts.find(({ text }) => text === '* = 38.0°')).toMatchObject({ colour: THEME.copper });
  });

  test('labels, when placed: keep clear of every measured point', () => {
    const { texts, place } = draw();
    const labels = texts.filter(({ text }) => /^(?:predicted|measured|B11)/u.test(text));

    for (const { x, y, text } of labels) {
      for (const point of sampleFinding().points) {
        const px = place('x', ((point.at.lean ?? 0) * 180) / Math.PI);
        const py = place('y', point.measured.value * 100);
        const inside = px > x && px < x + text.length * 6.7 && py > y - 10 && py < y + 3;
        expect(inside).toBe(false);
      }
    }
  });

  test('residuals beyond k, when drawn: have their figures with a true minus', () => {
    expect(wordsOf()).toEqual(expect.arrayContaining(['−2.2', '−3.1', '−3.6']));
    expect(wordsOf()).not.toContain('−1.1');
  });

  test('residuals within k, when drawn: are dots at their value', () => {
    const { arcs, place } = draw();

    const dot = arcs.find(({ radius, x }) => radius === 2.6 && Math.abs(x - place('x', 30)) < 0.01);

    expect(dot?.y).toBeCloseTo(place('z', -1.1), 6);
  });

  test('narrow, when drawn: has no labels at the curves and only the worst figure', () => {
    const words = wordsOf(sampleFinding(), NARROW);

    expect(words.join('|')).not.toMatch(/predicted, ±|measured, mean|excluded/u);
    expect(words.filter((text) => /^−[23]\.\d$/u.test(text))).toEqual(['−3.6']);
  });

  test('points without uncertainty or residual, when drawn: are shown without bars and stems', () => {
    const bare = sampleFinding().points.map((point) => ({
      ...point,
      z: null,
      measured: { ...point.measured, u: null },
    }));

    const { series } = comparisonScene(sampleFinding({ points: bare }), SAMPLE_EVIDENCE, settings);

    expect(series[0]?.points.every((point) => point.yBar === null)).toBe(true);
    expect(dataset('residuals', sampleFinding({ points: bare })).data).toEqual([]);
  });

  test('one point and no curve, when drawn: has axes round it', () => {
    const finding = sampleFinding({ points: [samplePoint(10, 36.3, 0)], curve: null, excluded: [] });

    expect(() => draw(finding)).not.toThrow();
  });

  test('a model fitted to these trials, when drawn: is called fitted', () => {
    const points = sampleFinding().points.map((point) => ({ ...point, fittedTo: true }));
    const words = wordsOf(sampleFinding({ points }));

    expect(words).toContain('fitted, ± ');
    expect(words.join('')).toContain('(measured − fitted)');
  });

  test('a residual of forty, when drawn: lies inside the strip', () => {
    const finding = sampleFinding({ points: [samplePoint(10, 50, 40), samplePoint(20, 42, 0)] });
    const { place, area } = draw(finding);

    expect(place('z', 40)).toBeGreaterThan(area.top);
    expect(wordsOf(finding)).toContain('+40.0');
  });
});

describe('chartHeight', () => {
  test('wide and narrow, when asked: are flatter than two to one, and nearly square', () => {
    expect(chartHeight(612)).toBeLessThan(612 / 2);
    expect(chartHeight(340)).toBeGreaterThan(340 / 2);
  });
});

describe('chartSentence', () => {
  const chart = { id: 'chart-1', n: 1, comparison: 'c-1', x: 'lean', sentence: '' };

  test('own sentence, when the team wrote one: is taken before the computed one', () => {
    expect(chartSentence(chart, sampleFinding())).toBe('Four of seven leans agree within 2u.');
    expect(chartSentence({ ...chart, sentence: 'Range against lean.' }, sampleFinding())).toBe(
      'Range against lean.',
    );
  });
});
