import type { Transaction } from 'sequelize';
import { evaluate } from '#shared/evidence/evaluate.ts';
import type { Evidence } from '#shared/evidence/evidence.ts';
import { findLeaks } from '#shared/leaks/find-leaks.ts';
import type { LeakMark } from '#shared/leaks/prepared-leak.ts';
import type { ReportDocument } from '#shared/report/schema/report-node.ts';
import type { Database } from '#server/database/database.ts';
import { DEMO_PEOPLE } from './people.ts';

/** What Tern Rock has prepared to say, by the leak's identity. */
const ANSWERS: readonly { readonly leak: string; readonly by: string; readonly text: string }[] = [
  {
    leak: 'excluded:trial-b11',
    by: 'demo-kasimir',
    text: 'The can slid back on the wedge and the range was read from the old mark. We saw it slide, and stopped; the trial stays in the chart, hollow.',
  },
  {
    leak: 'condition:model-3:swirl',
    by: 'demo-maren',
    text: 'We let the can stand for 20 seconds before the plug is drawn. A drop of dye in the head showed no turn after 15.',
  },
];

/** Found in the first model, and mended by the limits of the second. */
const MENDED: LeakMark = {
  leak: 'trust:c-plain',
  name: 'Outside trust',
  section: 'Model',
  question: 'Does the square-root law survive the last 2 cm of head?',
  evidence: 'The model is now trusted from a head of 4 cm on; A11 and A12 lie at 2 cm and are not compared.',
};

/** Two prepared answers and one mended leak, as they would stand after the team has opponents play. */
export async function seedLeaks(
  database: Database,
  problemId: string,
  work: { readonly evidence: Evidence; readonly document: ReportDocument; readonly at: string },
  transaction: Transaction,
): Promise<void> {
  const { leakAnswers, leakMarks } = database.models;
  const leaks = new Map(
    findLeaks({ ...work, findings: evaluate(work.evidence) }).map((leak) => [leak.id, leak]),
  );
  await leakAnswers.bulkCreate(
    ANSWERS.flatMap(({ leak, by, text }) => {
      const found = leaks.get(leak);
      const name = DEMO_PEOPLE.find(({ id }) => id === by)?.name;
      if (!found || !name) throw new RangeError(`seedLeaks: needs the leak ${leak} and its author`);
      return [{ problemId, leak, text, by: name, userId: by, at: work.at, basis: found.basis }];
    }),
    { transaction },
  );
  await leakMarks.create({ problemId, ...MENDED }, { transaction });
}
