import { dependentName, directDependencies, type Dependent } from './dependencies.ts';
import type { Register } from './register.ts';

/** How a quantity's value depends on where one stands. */
export interface Variation {
  /** It is made from what is read trial by trial, so that it has no value outside of a series. */
  readonly needsSeries: boolean;
  /** Its value may differ from one series to another. */
  readonly differsBySeries: boolean;
}

const FIXED: Variation = { needsSeries: false, differsBySeries: false };

/**
 * The variation of every quantity and equation by name (see dependentName). Cyclic definitions count as fixed.
 *
 * @param bySeries - quantities that some series holds or its trials carry
 */
export function findVariations(
  register: Register,
  bySeries: ReadonlySet<string>,
): ReadonlyMap<string, Variation> {
  const found = new Map<string, Variation>();

  function visit(dependent: Dependent): Variation {
    const name = dependentName(dependent);
    const known = found.get(name);
    if (known !== undefined) return known;
    found.set(name, FIXED);
    const variation = compute(dependent);
    found.set(name, variation);
    return variation;
  }

  function compute(dependent: Dependent): Variation {
    if (dependent.kind === 'comparison') return FIXED;
    const origin =
      dependent.kind === 'quantity' ? register.quantities.get(dependent.id)?.def.origin : undefined;
    if (origin === 'recorded') return { needsSeries: true, differsBySeries: true };
    if (origin === 'constant' && dependent.kind === 'quantity')
      return { needsSeries: false, differsBySeries: bySeries.has(dependent.id) };
    if (origin === 'summary' || origin === 'fitted') return FIXED;
    const inputs = directDependencies(register, dependent).map(visit);
    return {
      needsSeries: inputs.some(({ needsSeries }) => needsSeries),
      differsBySeries: inputs.some(({ differsBySeries }) => differsBySeries),
    };
  }

  const { quantities, models } = register.evidence;
  for (const { id } of quantities) visit({ kind: 'quantity', id });
  for (const { id, equations } of models)
    for (const { defines } of equations) visit({ kind: 'equation', model: id, quantity: defines });
  return found;
}
