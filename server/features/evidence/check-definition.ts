/** What may be stored of a definition. Text that cannot be read is refused; what is wrong only in company (units that do not agree, a circle of definitions) is stored and shown as a fault, so that nothing entered is lost. */
import {
  chartSchema,
  claimSchema,
  comparisonSchema,
  instrumentSchema,
  modelSchema,
  quantitySchema,
  seriesSchema,
} from '#shared/evidence/evidence.ts';
import type { Evidence } from '#shared/evidence/evidence.ts';
import type { DefinitionTable } from '#shared/contracts/evidence.ts';
import { checkClaim } from './checks/claim.ts';
import { checkComparison } from './checks/comparison.ts';
import { Fields } from './checks/fields.ts';
import { checkModel } from './checks/model.ts';
import { checkParts } from './checks/numbers.ts';
import { checkQuantity } from './checks/quantity.ts';
import { checkReference } from './checks/references.ts';
import { checkSeries } from './checks/series.ts';
import type { DefinitionRow } from './rows.ts';

/** The row as it may be stored (expressions by id), or 422 `invalid` with a sentence for each field, by its path from `row`. */
export function checkDefinition(table: DefinitionTable, row: object, evidence: Evidence): DefinitionRow {
  const fields = new Fields();
  const checked = checkRow(table, row, evidence, fields);
  fields.assertNone();
  return checked;
}

function checkRow(table: DefinitionTable, row: object, evidence: Evidence, fields: Fields): DefinitionRow {
  switch (table) {
    case 'instruments': {
      const instrument = instrumentSchema.parse(row);
      checkParts(instrument.parts, 'row.parts', fields);
      return instrument;
    }
    case 'quantities':
      return checkQuantity(quantitySchema.parse(row), evidence, fields);
    case 'series':
      return checkSeries(seriesSchema.parse(row), evidence, fields);
    case 'models':
      return checkModel(modelSchema.parse(row), evidence, fields);
    case 'comparisons':
      return checkComparison(comparisonSchema.parse(row), evidence, fields);
    case 'claims':
      return checkClaim(claimSchema.parse(row), evidence, fields);
    case 'charts': {
      const chart = chartSchema.parse(row);
      checkReference(evidence, 'comparisons', chart.comparison, 'row.comparison', fields);
      checkReference(evidence, 'quantities', chart.x, 'row.x', fields);
      return chart;
    }
  }
}
