import { Mailbox, mailboxLimit } from './mailbox.js';
import type { KeptMessage } from './message.js';

function buildMessage(number: number): KeptMessage {
  return {
    id: `id-${number}`,
    messageId: `<${number}@shop.test>`,
    receivedAt: new Date(number * 1000).toISOString(),
    deliveries: 1,
    from: 'shop@shop.test',
    to: ['ana@home.test'],
    replyTo: '',
    subject: `Message ${number}`,
    text: '',
    html: '',
    attachments: [],
  };
}

it(`keeps the last ${mailboxLimit} messages and lets the oldest go`, () => {
  const mailbox = new Mailbox();
  for (let number = 0; number < mailboxLimit + 3; number += 1) mailbox.add(buildMessage(number));
  const kept = mailbox.list();
  expect(kept).toHaveLength(mailboxLimit);
  expect(kept[0]?.subject).toBe(`Message ${mailboxLimit + 2}`);
  expect(kept.at(-1)?.subject).toBe('Message 3');
});
