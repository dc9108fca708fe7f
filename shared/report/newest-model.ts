import type { Evidence, Model } from '#shared/evidence/evidence.ts';

/** The newest model that has an equation for a quantity; null: none has. */
export function newestModelOf(quantity: string, { models }: Pick<Evidence, 'models'>): Model | null {
  return models
    .filter(({ equations }) => equations.some(({ defines }) => defines === quantity))
    .reduce<Model | null>((best, model) => (best === null || model.n > best.n ? model : best), null);
}
