import type { Transaction } from 'sequelize';
import { EDITION_SCHEMA_VERSION, type FrozenEdition } from '#shared/editions/frozen-edition.ts';
import { evaluate } from '#shared/evidence/evaluate.ts';
import { findingsToJson } from '#shared/evidence/findings-json.ts';
import { REPORT_SCHEMA_VERSION } from '#shared/report/schema/report-schema-version.ts';
import type { Database } from '#server/database/database.ts';
import { sealContent, storeEdition } from '#server/features/editions/service.ts';
import type { DemoEdition } from './leaning-spout-past.ts';
import { DEMO_PEOPLE } from './people.ts';
import type { DemoProblem } from './problems.ts';

/** Freezes the past editions of a problem as they would have been frozen then. Their PDFs are printed when asked for. */
export async function seedEditions(
  database: Database,
  problem: DemoProblem & { readonly id: string },
  team: { readonly name: string; readonly university: string },
  editions: readonly DemoEdition[],
  transaction: Transaction,
): Promise<void> {
  for (const [index, edition] of editions.entries()) {
    const content = contentOf(problem, team, edition);
    await storeEdition(
      database,
      {
        problemId: problem.id,
        n: index + 1,
        by: personOf(edition.by),
        note: edition.note,
        content,
        seal: sealContent(content),
        pdf: null,
      },
      transaction,
    );
  }
}

function contentOf(
  { number, title, statement, tasks, owners }: DemoProblem,
  team: { readonly name: string; readonly university: string },
  { evidence, document, at }: DemoEdition,
): FrozenEdition {
  const named = (id: string) => {
    const { name, role } = personOf(id);
    return { name, role };
  };
  const people = DEMO_PEOPLE.filter((person) => person.team === 'tern-rock').map(({ id }) => named(id));
  return {
    schemaVersion: EDITION_SCHEMA_VERSION,
    reportSchema: REPORT_SCHEMA_VERSION,
    problem: { number, title, statement, tasks: [...tasks], owners: owners.map(named) },
    team: { name: team.name, university: team.university, isDemo: true, people },
    evidence,
    document,
    findings: findingsToJson(evaluate(evidence)),
    files: [],
    at,
  };
}

function personOf(id: string) {
  const person = DEMO_PEOPLE.find((candidate) => candidate.id === id);
  if (!person) throw new RangeError(`personOf: needs a person of the demonstration, got ${id}`);
  return person;
}
