import { nodesOf } from '#shared/report/document-text.ts';
import type { FrozenEdition } from './frozen-edition.ts';

/** What a list tells of an edition's content. */
export interface EditionFigures {
  /** Trials in its evidence, excluded ones too; those taken back are not counted. */
  readonly trials: number;
  /** Live values in its report. */
  readonly tiedNumbers: number;
}

/** Counts what an edition holds. */
export function editionFigures({
  evidence,
  document,
}: Pick<FrozenEdition, 'evidence' | 'document'>): EditionFigures {
  let tiedNumbers = 0;
  for (const { type } of nodesOf(document)) if (type === 'liveValue') tiedNumbers += 1;
  return { trials: evidence.trials.filter(({ withdrawn }) => !withdrawn).length, tiedNumbers };
}
