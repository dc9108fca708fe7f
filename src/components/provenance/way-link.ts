import type { Evidence } from '#shared/evidence/evidence.ts';
import type { ProvenanceWay } from '#shared/report/provenance.ts';
import { paths } from '#src/lib/paths.ts';
import type { ProblemAddress } from '#src/lib/problem/problem-address.ts';

/** Where a card leads on to, as a link in words. */
export function wayLink(
  way: ProvenanceWay,
  address: ProblemAddress,
  evidence: Evidence,
): { readonly to: string; readonly words: string } {
  switch (way.station) {
    case 'trials': {
      const series = evidence.series.find(({ id }) => id === way.series);
      const trial = evidence.trials.find(({ id }) => id === way.trial);
      const name = series && trial ? `${series.letter}${trial.number}` : undefined;
      return {
        to: paths.trials(address, series?.letter, name),
        words: name === undefined ? 'Go to trials' : `Go to ${name}`,
      };
    }
    case 'register':
      return { to: paths.trials(address), words: 'Go to quantities' };
    case 'model': {
      const n = evidence.models.find(({ id }) => id === way.model)?.n;
      return { to: paths.model(address, n), words: n === undefined ? 'Go to model' : `Go to model ${n}` };
    }
    case 'claims':
      return {
        to: paths.claims(address, evidence.claims.find(({ id }) => id === way.claim)?.n),
        words: 'Go to claims',
      };
  }
}
