/** Runs the benchmark groups and prints `name | value | reach | ok` (or `short`, or `not run`). */
import { existsSync } from 'node:fs';

/** One figure: `ok` when the value is within reach; null when a peer it is compared with is missing. */
export interface Figure {
  readonly name: string;
  readonly value: number | null;
  readonly reach: number;
  readonly unit: string;
  readonly ok: boolean;
}

const GROUPS = ['core', 'report', 'size'];
const wanted = process.argv.slice(2);
const unknown = wanted.filter((group) => !GROUPS.includes(group));
if (unknown.length > 0) {
  console.error(`There is no group ${unknown.join(', ')}; there are ${GROUPS.join(', ')}.`);
  process.exit(2);
}

let isShort = false;
for (const group of wanted.length > 0 ? wanted : GROUPS) {
  const file = new URL(`./${group}.ts`, import.meta.url);
  if (!existsSync(file)) {
    console.log(`${group} | - | - | not run`);
    continue;
  }
  const { benchmarks } = (await import(file.href)) as { benchmarks: () => Promise<Figure[]> };
  for (const { name, value, reach, unit, ok } of await benchmarks()) {
    const word = value === null ? 'not run' : ok ? 'ok' : 'short';
    isShort ||= word === 'short';
    console.log(
      `${group}: ${name} | ${value === null ? '-' : `${round(value)} ${unit}`} | ${reach} ${unit} | ${word}`,
    );
  }
}
process.exit(isShort ? 1 : 0);

function round(value: number): string {
  return value >= 100 ? value.toFixed(0) : value.toPrecision(3);
}
