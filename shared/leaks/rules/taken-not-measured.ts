import type { Evidence } from '#shared/evidence/evidence.ts';
import type { Findings } from '#shared/evidence/findings.ts';
import type { LeakPlace, LeakRule } from '../leak.ts';

/** A share of u² below this moves no verdict. */
const SMALLEST_SHARE = 0.1;

interface Taken {
  readonly share: number;
  readonly claim: number;
}

/**
 * An uncertainty or a value that is taken on trust and carries a claim: pressure 2 + 3.5 · its largest share of the u²
 * of a claim's difference. Taken are constants with the status assumed, stated parts, and what instruments are said to do.
 */
export const takenNotMeasured: LeakRule = {
  name: 'Taken, not measured',
  code: 'taken',
  find: ({ evidence, findings }) =>
    [...takenShares(evidence, findings)].flatMap(([source, { share, claim }]) => {
      const found = findings.sources.get(source);
      if (found === undefined || share < SMALLEST_SHARE) return [];
      const percent = Math.round(share * 100);
      return [
        {
          about: [source],
          section: 'Experiment',
          question: `How do you know that “${found.words}” is no larger than you say?`,
          evidence: `It is taken and not measured, and makes ${percent} % of the u² of claim ${claim}.`,
          mend: 'Measure it once against something better, and log that; or show that the claim stands without it.',
          place: placeOf(source, evidence),
          pressure: 2 + 3.5 * share,
        },
      ];
    }),
};

/** The largest share of each taken source among the claims' differences. */
function takenShares(evidence: Evidence, findings: Findings): ReadonlyMap<string, Taken> {
  const largest = new Map<string, Taken>();
  for (const claim of evidence.claims) {
    const difference = findings.claims.get(claim.id)?.difference;
    if (!difference?.u) continue;
    for (const { source, c } of difference.parts) {
      if (!isTaken(source, evidence, findings)) continue;
      const share = (c / difference.u) ** 2;
      if (share > (largest.get(source)?.share ?? 0)) largest.set(source, { share, claim: claim.n });
    }
  }
  return largest;
}

function isTaken(source: string, evidence: Evidence, findings: Findings): boolean {
  const kind = findings.sources.get(source)?.kind;
  if (kind === 'stated' || (kind === 'instrument' && source.startsWith('inst:'))) return true;
  return kind === 'constant' && constantOf(source, evidence)?.status === 'assumed';
}

function constantOf(source: string, evidence: Evidence) {
  const [, id] = source.split(':');
  return source.startsWith('const:') ? evidence.quantities.find((quantity) => quantity.id === id) : undefined;
}

function placeOf(source: string, evidence: Evidence): LeakPlace {
  const quantity =
    constantOf(source, evidence) ??
    evidence.quantities.find(
      ({ def }) =>
        (def.origin === 'recorded' || def.origin === 'constant') && def.instrument === source.split(':')[1],
    );
  return quantity ? { kind: 'quantity', id: quantity.id } : { kind: 'section', section: 'Experiment' };
}
