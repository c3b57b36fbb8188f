import { OutboxMail } from '../../src/mail/entities/outbox-mail.entity.js';
import type { TestApp } from './test-app.js';

/** What was put in the outbox for an address, oldest first. */
export const outboxOf = (test: TestApp, recipient: string): Promise<OutboxMail[]> =>
  test.dataSource.manager.find(OutboxMail, { where: { recipient }, order: { id: 'ASC' } });

/** The secret at the end of the link in the last mail of a template. */
export async function lastLinkOf(test: TestApp, recipient: string, template: string): Promise<string> {
  const mails = (await outboxOf(test, recipient)).filter((mail) => mail.template === template);
  return String(mails.at(-1)?.data['url']).split('/').at(-1)!;
}
