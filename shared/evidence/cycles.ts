import { dependentName, directDependencies, type Dependent } from './dependencies.ts';
import { fault } from './fault.ts';
import type { Fault } from './findings.ts';
import { symbolName, type Register } from './register.ts';
import { listInWords } from './words.ts';

interface Visit {
  readonly index: number;
  low: number;
  onStack: boolean;
}

/**
 * Everything that is defined through itself, by name (see dependentName), each with its fault.
 *
 * Source of the method: R. Tarjan, Depth-first search and linear graph algorithms, SIAM J. Comput. 1, 146 (1972).
 */
export function findCycles(register: Register): ReadonlyMap<string, Fault> {
  const cycles = new Map<string, Fault>();
  const visits = new Map<string, Visit>();
  const stack: Dependent[] = [];

  function visit(dependent: Dependent): Visit {
    const own: Visit = { index: visits.size, low: visits.size, onStack: true };
    visits.set(dependentName(dependent), own);
    stack.push(dependent);
    let reachesItself = false;
    for (const next of directDependencies(register, dependent)) {
      const known = visits.get(dependentName(next));
      if (known === own) reachesItself = true;
      if (known === undefined) own.low = Math.min(own.low, visit(next).low);
      else if (known.onStack) own.low = Math.min(own.low, known.index);
    }
    if (own.low === own.index) close(dependent, reachesItself);
    return own;
  }

  function close(root: Dependent, reachesItself: boolean): void {
    const start = stack.findIndex((entry) => dependentName(entry) === dependentName(root));
    const members = stack.splice(start);
    for (const member of members) {
      const seen = visits.get(dependentName(member));
      if (seen !== undefined) seen.onStack = false;
    }
    if (members.length > 1 || reachesItself)
      for (const member of members) cycles.set(dependentName(member), cycleFault(register, members, member));
  }

  const { quantities, models, comparisons } = register.evidence;
  const roots: Dependent[] = quantities.map(({ id }) => ({ kind: 'quantity', id }));
  for (const model of models)
    for (const { defines } of model.equations)
      roots.push({ kind: 'equation', model: model.id, quantity: defines });
  for (const { id } of comparisons) roots.push({ kind: 'comparison', id });
  for (const root of roots) if (!visits.has(dependentName(root))) visit(root);
  return cycles;
}

function cycleFault(register: Register, members: readonly Dependent[], member: Dependent): Fault {
  const at = member.kind === 'equation' ? member.model : member.id;
  const names = new Set(members.map((one) => nameOf(register, one)).sort());
  const sentence =
    names.size === 1
      ? `${[...names].join('')} is defined through itself. Change its definition.`
      : `${listInWords([...names])} are defined through one another. Change one of them.`;
  return fault('cycle', sentence, at);
}

function nameOf(register: Register, dependent: Dependent): string {
  if (dependent.kind === 'equation') return symbolName(register, dependent.quantity);
  if (dependent.kind === 'quantity') return symbolName(register, dependent.id);
  return `the comparison “${register.comparisons.get(dependent.id)?.name ?? ''}”`;
}
