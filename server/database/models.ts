/** Every table as a Sequelize model, bound to one connection; and what they are to one another. */
import type { Sequelize } from 'sequelize';
import { defineTokens, defineUsers } from '#server/features/account/model.ts';
import {
  defineCopies,
  defineCopyQuestions,
  defineCopyRooms,
  defineCopyViews,
} from '#server/features/copies/model.ts';
import { defineEditions } from '#server/features/editions/model.ts';
import { defineAllDefinitions, defineAuditEvents } from '#server/features/evidence/model.ts';
import { defineEvents } from '#server/features/fights/model.ts';
import { defineFiles } from '#server/features/files/model.ts';
import { defineInvitations } from '#server/features/invitations/model.ts';
import { defineLeakAnswers, defineLeakMarks } from '#server/features/leaks/model.ts';
import { defineMarginNotes, defineNoteReplies } from '#server/features/notes/model.ts';
import { defineProblems, defineTasks } from '#server/features/problems/model.ts';
import { defineReportDocs, defineReportUpdates } from '#server/features/report/model.ts';
import { defineSessions } from '#server/features/session/model.ts';
import { defineFights, defineMemberships, defineTeams } from '#server/features/teams/model.ts';
import { defineTrials } from '#server/features/trials/model.ts';
import { defineOutbox } from '#server/mail/model.ts';

export type Models = ReturnType<typeof defineModels>;

export function defineModels(sequelize: Sequelize) {
  return {
    users: defineUsers(sequelize),
    tokens: defineTokens(sequelize),
    sessions: defineSessions(sequelize),
    teams: defineTeams(sequelize),
    memberships: defineMemberships(sequelize),
    invitations: defineInvitations(sequelize),
    outbox: defineOutbox(sequelize),
    fights: defineFights(sequelize),
    events: defineEvents(sequelize),
    problems: defineProblems(sequelize),
    tasks: defineTasks(sequelize),
    definitions: defineAllDefinitions(sequelize),
    trials: defineTrials(sequelize),
    auditEvents: defineAuditEvents(sequelize),
    reportDocs: defineReportDocs(sequelize),
    files: defineFiles(sequelize),
    leakAnswers: defineLeakAnswers(sequelize),
    leakMarks: defineLeakMarks(sequelize),
    marginNotes: defineMarginNotes(sequelize),
    noteReplies: defineNoteReplies(sequelize),
    reportUpdates: defineReportUpdates(sequelize),
    editions: defineEditions(sequelize),
    copies: defineCopies(sequelize),
    copyViews: defineCopyViews(sequelize),
    copyRooms: defineCopyRooms(sequelize),
    copyQuestions: defineCopyQuestions(sequelize),
  };
}
