import { symbolToText } from '#shared/formatting/symbol.ts';
import { counted } from '#shared/evidence/words.ts';
import type { LeakRule } from '../leak.ts';
import { usesOfQuantity } from '../uses-of-quantity.ts';

/** A quantity that is named and has no value: pressure 4.5 + 0.8 for each use. */
export const namedNotMeasured: LeakRule = {
  name: 'Named, not measured',
  code: 'named',
  find: ({ evidence, document }) =>
    evidence.quantities.flatMap((quantity) => {
      if (quantity.def.origin !== 'constant' || quantity.def.reading !== null) return [];
      const { mentions, equations, section } = usesOfQuantity(quantity.id, evidence, document);
      const uses = mentions + equations;
      if (uses === 0) return [];
      const symbol = symbolToText(quantity.symbol);
      const places = [
        ...(mentions > 0 ? [`in ${counted(mentions, 'place')} of the report`] : []),
        ...(equations > 0 ? [`in ${counted(equations, 'equation')}`] : []),
      ];
      return [
        {
          about: [quantity.id],
          section: section ?? 'Model',
          question: `You name ${quantity.name}. What value did you use?`,
          evidence: `${symbol} stands ${places.join(' and ')} and has no trial and no source.`,
          mend: `Measure ${symbol}, or give a published value with its source, or leave it out.`,
          place: { kind: 'quantity', id: quantity.id },
          pressure: 4.5 + 0.8 * uses,
        },
      ];
    }),
};
