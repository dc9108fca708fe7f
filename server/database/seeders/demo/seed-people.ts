import type { Transaction } from 'sequelize';
import type { Database } from '#server/database/database.ts';
import { composeMail } from '#server/mail/compose-mail.ts';
import { expiryOf, sayUtc } from '#server/tokens/expiry.ts';
import { hashSecretToken, newSecretToken } from '#server/tokens/secret-token.ts';

const DAY_MS = 86_400_000;
const TEAM = { id: 'demo-tern-rock', name: 'Tern Rock', university: 'Skerry University' };

/** Whom the captain asked: one is in the team by now, one has not answered. Nobody holds the link of either. */
const ASKED = [
  { id: 'demo-invitation-1', name: 'Petra Abiola', email: 'petra.abiola@skerry.example', daysAgo: 40 },
  { id: 'demo-invitation-2', name: 'Tarjei Holm', email: 'tarjei.holm@skerry.example', daysAgo: 3 },
] as const;

/** One invitation that waits, and the two mails that the team has caused; both count as sent, so none ever leaves. */
export async function seedPeople(
  database: Database,
  firstStart: Date,
  transaction: Transaction,
): Promise<void> {
  for (const { id, name, email, daysAgo } of ASKED) {
    const asked = new Date(firstStart.getTime() - daysAgo * DAY_MS);
    const at = asked.toISOString();
    const expiresAt = expiryOf('invitation', asked);
    await database.models.outbox.create(
      {
        ...composeMail('invitation', {
          name,
          by: 'Ines Farrow',
          team: TEAM.name,
          university: TEAM.university,
          role: 'a member',
          until: sayUtc(expiresAt),
        }),
        id: `${id}-mail`,
        teamId: TEAM.id,
        concerns: id,
        kind: 'invitation',
        address: email,
        name,
        link: null,
        state: 'sent',
        nextTryAt: null,
        writtenAt: at,
        sentAt: at,
      },
      { transaction },
    );
    if (expiresAt <= firstStart.toISOString()) continue;
    await database.models.invitations.create(
      {
        id,
        teamId: TEAM.id,
        tokenHash: hashSecretToken(newSecretToken()),
        email,
        name,
        role: 'member',
        invitedBy: 'demo-ines',
        invitedAt: at,
        expiresAt,
      },
      { transaction },
    );
  }
}
