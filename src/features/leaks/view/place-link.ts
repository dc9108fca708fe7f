import type { Evidence } from '#shared/evidence/evidence.ts';
import type { LeakPlace } from '#shared/leaks/leak.ts';
import { REPORT_SECTIONS } from '#shared/report/schema/section-type.ts';
import { paths } from '#src/lib/paths.ts';
import type { ProblemAddress } from '#src/lib/problem/problem-address.ts';

/** Where a leak is looked at and mended. */
export function placeLink(place: LeakPlace, at: ProblemAddress, evidence: Evidence): string {
  switch (place.kind) {
    case 'comparison': {
      const model = evidence.comparisons.find(({ id }) => id === place.id)?.model;
      return paths.model(at, evidence.models.find(({ id }) => id === model)?.n);
    }
    case 'claim':
      return paths.claims(at, evidence.claims.find(({ id }) => id === place.id)?.n);
    case 'quantity':
      return paths.trials(at);
    case 'model':
      return paths.model(at, evidence.models.find(({ id }) => id === place.id)?.n);
    case 'trial': {
      const trial = evidence.trials.find(({ id }) => id === place.id);
      const letter = evidence.series.find(({ id }) => id === trial?.series)?.letter;
      return trial && letter ? paths.trials(at, letter, `${letter}${trial.number}`) : paths.trials(at);
    }
    case 'series':
      return paths.trials(at, evidence.series.find(({ id }) => id === place.id)?.letter);
    case 'section':
      return paths.report(at, REPORT_SECTIONS.find(({ name }) => name === place.section)?.number);
  }
}
