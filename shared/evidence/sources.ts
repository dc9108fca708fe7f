import type { SourceFreedom } from '#shared/uncertainty/combined-degrees-of-freedom.ts';
import type { UncertaintyPart } from './evidence.ts';
import type { Source } from './findings.ts';
import { seriesName, symbolName, trialName, type Register } from './register.ts';

/** Degrees of freedom that only an evaluation knows. */
export interface EvaluatedFreedom {
  /** Of the scatter behind a mean, by the mean's key. */
  readonly ofMean: (key: string) => number;
  /** Of a comparison's statistical parts. */
  readonly ofFit: (comparison: string) => number;
}

/** An independent source of uncertainty in words, from its name. */
export function describeSource(register: Register, id: string, evaluated: EvaluatedFreedom): Source {
  const [family = '', owner = '', name = ''] = id.split(':');
  switch (family) {
    case 'inst':
      return instrumentSource(register, id, owner, name);
    case 'const':
      return constantSource(register, id, owner, name);
    case 'held': {
      const words = `${symbolName(register, name)} as held in ${seriesName(register, owner)}`;
      return source(id, words, 'constant', Infinity, true);
    }
    case 'fit': {
      const words = `fit of “${register.comparisons.get(owner)?.name ?? 'a comparison that is gone'}”`;
      return source(id, words, 'fit', evaluated.ofFit(owner), true);
    }
    case 'mean': {
      const key = id.slice('mean:'.length);
      const words = `scatter of ${symbolName(register, key.split('@')[0] ?? '')}`;
      return source(id, words, 'scatter', evaluated.ofMean(key), false);
    }
    case 'trial': {
      const words = `reading of ${symbolName(register, name)} in ${trialName(register, owner)}`;
      return source(id, words, 'reading', Infinity, false);
    }
    default: {
      const words = `setting of ${symbolName(register, owner.split('@')[0] ?? '')}`;
      return source(id, words, 'reading', Infinity, false);
    }
  }
}

/** How well a source is known, for effective degrees of freedom; the columns of one fit count together. */
export function sourceFreedom(register: Register, id: string, evaluated: EvaluatedFreedom): SourceFreedom {
  const { degreesOfFreedom, kind } = describeSource(register, id, evaluated);
  return kind === 'fit' ? { degreesOfFreedom, pool: id.slice(0, id.lastIndexOf(':')) } : { degreesOfFreedom };
}

function source(
  id: string,
  words: string,
  kind: Source['kind'],
  degreesOfFreedom: number,
  shared: boolean,
): Source {
  return { id, words, kind, degreesOfFreedom, shared };
}

function instrumentSource(register: Register, id: string, instrument: string, name: string): Source {
  const row = register.instruments.get(instrument);
  const families = { offset: 'zero', gain: 'scale' };
  const family = name.startsWith('gain') ? 'gain' : 'offset';
  const shared =
    row?.parts.filter((part) => part.shared && (part.kind === 'scale') === (family === 'gain')) ?? [];
  const part = shared[Math.max(0, Number(name.slice(family.length) || '1') - 1)];
  const words = `${row?.name ?? 'an instrument that is gone'}, ${families[family]} common to all`;
  return source(id, words, 'instrument', part?.degreesOfFreedom ?? Infinity, true);
}

function constantSource(register: Register, id: string, quantity: string, name: string): Source {
  const symbol = symbolName(register, quantity);
  const def = register.quantities.get(quantity)?.def;
  const parts: readonly UncertaintyPart[] = def?.origin === 'constant' ? def.parts : [];
  const part = name === 'own' ? undefined : parts[Number(name)];
  const words = part?.reason === undefined ? `${symbol} as it was read` : `${symbol}: ${part.reason}`;
  return source(
    id,
    words,
    part === undefined ? 'constant' : 'stated',
    part?.degreesOfFreedom ?? Infinity,
    true,
  );
}
