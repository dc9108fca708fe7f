import type { Express } from 'express';
import {
  addQuestion as addQuestionEndpoint,
  changeQuestion as changeQuestionEndpoint,
  changeRoom as changeRoomEndpoint,
  enterRoom as enterRoomEndpoint,
  getRoom as getRoomEndpoint,
  listQuestions as listQuestionsEndpoint,
  removeQuestion as removeQuestionEndpoint,
} from '#shared/contracts/copy-questions.ts';
import type { ServerDeps } from '#server/deps.ts';
import { mountOpen, type MountOptions } from '#server/middleware/mount.ts';
import {
  addQuestion,
  changeQuestion,
  changeRoom,
  enterRoom,
  getRoom,
  listQuestions,
  removeQuestion,
} from './questions.ts';
import { keepPass, visitorOf } from './visitor.ts';

/** The room of a copy's questions. */
export function mountCopyQuestions(app: Express, deps: ServerDeps, guarded: MountOptions): void {
  mountOpen(app, getRoomEndpoint, ({ request }) => getRoom(deps, visitorOf(request)), guarded);

  mountOpen(
    app,
    enterRoomEndpoint,
    async ({ request, response, body }) => {
      keepPass(request, response, 'room', await enterRoom(deps, visitorOf(request), body.key));
    },
    guarded,
  );

  mountOpen(
    app,
    changeRoomEndpoint,
    ({ request, body }) => changeRoom(deps, visitorOf(request), body.seconds),
    guarded,
  );

  mountOpen(app, listQuestionsEndpoint, ({ request }) => listQuestions(deps, visitorOf(request)), guarded);

  mountOpen(
    app,
    addQuestionEndpoint,
    ({ request, body }) => addQuestion(deps, visitorOf(request), body),
    guarded,
  );

  mountOpen(
    app,
    changeQuestionEndpoint,
    ({ request, body, param }) => changeQuestion(deps, visitorOf(request), param('question'), body),
    guarded,
  );

  mountOpen(
    app,
    removeQuestionEndpoint,
    ({ request, param }) => removeQuestion(deps, visitorOf(request), param('question')),
    guarded,
  );
}
