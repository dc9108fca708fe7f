/** How long the demonstration's report takes as PDF, in the thread that the server uses, once its faces are parsed. */
import pino from 'pino';
import { createReportRenderer } from '#server/rendering/report-renderer.ts';
import { demoInput } from '#tests/server/rendering/demo-input.ts';
import type { Figure } from './run.ts';

const WARMING = 3;
const RUNS = 9;
const REACH_SECONDS = 0.5;

export async function benchmarks(): Promise<Figure[]> {
  const renderer = createReportRenderer(pino({ enabled: false }));
  const input = demoInput();
  const seconds: number[] = [];
  try {
    for (let i = 0; i < WARMING; i++) await renderer.render(input);
    for (let i = 0; i < RUNS; i++) {
      const start = performance.now();
      await renderer.render(input);
      seconds.push((performance.now() - start) / 1000);
    }
  } finally {
    await renderer.close();
  }
  const median = seconds.toSorted((a, b) => a - b)[Math.floor(RUNS / 2)] ?? Infinity;
  return [
    {
      name: 'PDF of the demonstration, warm',
      value: median,
      reach: REACH_SECONDS,
      unit: 's',
      ok: median <= REACH_SECONDS,
    },
  ];
}
