import { Op } from 'sequelize';
import type { Logger } from 'pino';
import type { Database } from '#server/database/database.ts';
import { LINK_PLACE } from './compose-mail.ts';
import { mailFailure } from './failure-words.ts';
import type { MailModel } from './model.ts';
import type { MailTransport } from './transport.ts';

const MINUTE = 60_000;
/** How long to wait after each failed try; when they are used up, the mail has failed: a good day. */
const WAITS = [1, 5, 15, 60, 240, 480, 720].map((minutes) => minutes * MINUTE);
const AT_ONCE = 20;

export interface MailDeliveryOptions {
  readonly database: Database;
  readonly transport: MailTransport;
  readonly logger: Logger;
  readonly now: () => Date;
  /** Called when the state of a team's mail has changed. */
  readonly onChange: (teamId: string) => Promise<void>;
}

/** Takes what is due from the outbox to the transport, one mail after the other. A request never waits for it. */
export class MailDelivery {
  readonly #options: MailDeliveryOptions;
  #running: Promise<void> = Promise.resolve();

  constructor(options: MailDeliveryOptions) {
    this.#options = options;
  }

  /** Delivers what is due once whatever is under way is done; never rejects. */
  wake(): Promise<void> {
    this.#running = this.#running
      .then(() => this.#deliverDue())
      .catch((error: unknown) => {
        this.#options.logger.error({ err: error }, 'mail was not delivered');
      });
    return this.#running;
  }

  /** Does work beside the request that asked for it, so that the time of its answer tells nothing, then delivers. */
  aside(work: () => Promise<void>): void {
    this.#running = this.#running.then(work).catch((error: unknown) => {
      this.#options.logger.error({ err: error }, 'mail was not written');
    });
    void this.wake();
  }

  /** Waits for the mail under way. */
  async close(): Promise<void> {
    await this.#running;
    this.#options.transport.close();
  }

  async #deliverDue(): Promise<void> {
    const { database, now } = this.#options;
    const due = await database.models.outbox.findAll({
      where: { state: 'waiting', nextTryAt: { [Op.lte]: now().toISOString() } },
      order: [['nextTryAt', 'ASC']],
      limit: AT_ONCE,
      raw: true,
    });
    for (const mail of due) await this.#deliver(mail);
  }

  async #deliver(mail: MailModel): Promise<void> {
    const { transport, logger } = this.#options;
    try {
      await transport.send({
        id: mail.id,
        writtenAt: mail.writtenAt,
        to: { name: mail.name, address: mail.address },
        subject: mail.subject,
        text: mail.text.replaceAll(LINK_PLACE, () => mail.link ?? ''),
      });
    } catch (error) {
      const failure = mailFailure(error);
      logger.warn({ mail: mail.id, tries: mail.tries + 1, why: failure.words }, 'mail was not taken');
      await this.#keep(mail, this.#afterFailure(mail, failure));
      return;
    }
    const sentAt = this.#options.now().toISOString();
    await this.#keep(mail, { state: 'sent', link: null, nextTryAt: null, error: null, sentAt });
  }

  #afterFailure(mail: MailModel, { words, isFinal }: ReturnType<typeof mailFailure>): Partial<MailModel> {
    const tries = mail.tries + 1;
    const wait = WAITS[mail.tries];
    if (isFinal || wait === undefined) {
      // An invitation may be tried again by hand; a new passphrase is asked for anew.
      const link = mail.kind === 'reset' ? null : mail.link;
      return { state: 'failed', tries, nextTryAt: null, error: words, link };
    }
    const nextTryAt = new Date(this.#options.now().getTime() + wait).toISOString();
    return { tries, nextTryAt, error: words };
  }

  async #keep(mail: MailModel, change: Partial<MailModel>): Promise<void> {
    const { database, onChange } = this.#options;
    // A mail that was dropped while it was under way stays dropped, unless it left all the same.
    const states = change.state === 'sent' ? ['waiting', 'failed'] : ['waiting'];
    await database.write((transaction) =>
      database.models.outbox.update(change, { where: { id: mail.id, state: states }, transaction }),
    );
    if (mail.teamId !== null) await onChange(mail.teamId);
  }
}
