import type { Express, RequestHandler } from 'express';
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
import { findCopy, noCopy } from './find-copy.ts';
import {
  addQuestion,
  changeQuestion,
  changeRoom,
  enter,
  enterRoom,
  getRoom,
  listQuestions,
  removeQuestion,
} from './questions.ts';
import { keepPass, visitorOf } from './visitor.ts';

/** The room of a copy's questions. */
export function mountCopyQuestions(app: Express, deps: ServerDeps, { before = [] }: MountOptions): void {
  // Before anything of the request is looked at: for who lent the copy there is no room, whatever they send.
  const refuseLenders: RequestHandler = async (request, _response, next) => {
    if ((await findCopy(deps, visitorOf(request)))?.isLender) throw noCopy();
    next();
  };
  const needKey: RequestHandler = async (request, _response, next) => {
    await enter(deps, visitorOf(request));
    next();
  };
  const guarded = { before: [...before, refuseLenders] };
  const keyed = { before: [...guarded.before, needKey] };

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
    keyed,
  );

  mountOpen(app, listQuestionsEndpoint, ({ request }) => listQuestions(deps, visitorOf(request)), guarded);

  mountOpen(
    app,
    addQuestionEndpoint,
    ({ request, body }) => addQuestion(deps, visitorOf(request), body),
    keyed,
  );

  mountOpen(
    app,
    changeQuestionEndpoint,
    ({ request, body, param }) => changeQuestion(deps, visitorOf(request), param('question'), body),
    keyed,
  );

  mountOpen(
    app,
    removeQuestionEndpoint,
    ({ request, param }) => removeQuestion(deps, visitorOf(request), param('question')),
    keyed,
  );
}
