import { appendFileSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { createTransport, type SendMailOptions } from 'nodemailer';
import { type MailFake, startMailFake } from './mail-fake.js';
import type { MessageJson } from './message-json.js';

const stateFile = join(tmpdir(), `mail-fake-${process.pid}.jsonl`);
let fake: MailFake;

beforeEach(async () => {
  fake = await startMailFake({ stateFile });
});

afterEach(async () => {
  await fake.stop();
  rmSync(stateFile, { force: true });
});

async function send(overrides: SendMailOptions = {}): Promise<string> {
  const transport = createTransport({ host: '127.0.0.1', port: fake.smtpPort, ignoreTLS: true });
  const sent = await transport.sendMail({
    from: 'Cedar Lane Cabinets <office@cedar.test>',
    to: 'Ana@Home.test',
    subject: 'Your estimate',
    text: 'Read it at http://localhost:4310/e/abc?x=1&y=2.',
    ...overrides,
  });
  return sent.messageId;
}

async function messages(query = ''): Promise<MessageJson[]> {
  const response = await fetch(`${fake.inboxUrl}/api/messages${query}`);
  return ((await response.json()) as { messages: MessageJson[] }).messages;
}

async function pageText(path: string): Promise<string> {
  return (await fetch(fake.inboxUrl + path)).text();
}

async function planFaults(faults: object): Promise<void> {
  const headers = { 'Content-Type': 'application/json' };
  await fetch(`${fake.inboxUrl}/api/faults`, { method: 'PUT', headers, body: JSON.stringify(faults) });
}

describe('what comes in over SMTP', () => {
  it('is given out as JSON with its links', async () => {
    const messageId = await send({
      html: '<p><a href="http://localhost:4310/e/abc?x=1&amp;y=2">Read</a></p>',
    });
    const [message, ...others] = await messages();
    expect(others).toEqual([]);
    expect(message).toMatchObject({
      messageId,
      to: ['ana@home.test'],
      subject: 'Your estimate',
      deliveries: 1,
    });
    expect(message?.from).toContain('office@cedar.test');
    expect(message?.links).toContain('http://localhost:4310/e/abc?x=1&y=2');
  });

  it('names hidden recipients too', async () => {
    await send({ bcc: 'books@cedar.test' });
    expect((await messages())[0]?.to).toEqual(['ana@home.test', 'books@cedar.test']);
  });

  it('keeps every character and takes a sender with a password', async () => {
    const transport = createTransport({
      host: '127.0.0.1',
      port: fake.smtpPort,
      ignoreTLS: true,
      auth: { user: 'shop', pass: 'any' },
    });
    await transport.sendMail({ from: 'a@b.test', to: 'c@d.test', subject: 'Größe 23 5/8″ − ½', text: 'Å ✓' });
    expect((await messages())[0]).toMatchObject({
      subject: 'Größe 23 5/8″ − ½',
      text: expect.stringContaining('Å ✓'),
    });
  });

  it('returns attachments byte for byte', async () => {
    const content = Buffer.from([0x25, 0x50, 0x44, 0x46, 0x00, 0xff, 0x0a]);
    await send({ attachments: [{ filename: 'estimate 12.pdf', content, contentType: 'application/pdf' }] });
    const attachment = (await messages())[0]?.attachments[0];
    expect(attachment).toMatchObject({
      name: 'estimate 12.pdf',
      contentType: 'application/pdf',
      sizeBytes: 7,
    });
    const response = await fetch(fake.inboxUrl + attachment?.url);
    expect(response.headers.get('content-disposition')).toContain('attachment');
    expect(Buffer.from(await response.arrayBuffer())).toEqual(content);
  });

  it('counts a repeated Message-ID instead of keeping it twice', async () => {
    await send({ messageId: '<one@cedar.test>' });
    await send({ messageId: '<one@cedar.test>' });
    await send({ messageId: '<two@cedar.test>' });
    expect((await messages()).map(({ messageId, deliveries }) => [messageId, deliveries])).toEqual([
      ['<two@cedar.test>', 1],
      ['<one@cedar.test>', 2],
    ]);
  });

  it('refuses a message over 25 MB', async () => {
    await expect(send({ text: 'x'.repeat(26 * 1024 * 1024) })).rejects.toMatchObject({ responseCode: 552 });
    expect(await messages()).toEqual([]);
  });
});

describe('looking for messages', () => {
  it('narrows by recipient, subject and instant', async () => {
    await send({ to: 'one@home.test', subject: 'Invoice 7' });
    await send({ to: 'two@home.test', subject: 'Invoice 8' });
    expect(await messages('?to=ONE@home.test')).toHaveLength(1);
    expect(await messages('?subject=invoice%208')).toHaveLength(1);
    expect(await messages('?to=one@home.test&subject=invoice%208')).toEqual([]);
    expect(await messages('?since=2000-01-01T00:00:00.000Z')).toHaveLength(2);
    expect(await messages('?since=2999-01-01T00:00:00.000Z')).toEqual([]);
  });

  it('forgets all when told to', async () => {
    await send();
    await fetch(`${fake.inboxUrl}/api/messages`, { method: 'DELETE' });
    expect(await messages()).toEqual([]);
  });
});

describe('the inbox in the browser', () => {
  it('lists the newest first and leads to each', async () => {
    await send({ subject: 'First' });
    await send({ subject: 'Second' });
    const page = await pageText('/');
    expect(page.indexOf('Second')).toBeLessThan(page.indexOf('First'));
    const [message] = await messages();
    expect(page).toContain(`href="/messages/${message?.id}"`);
    expect(await pageText(`/messages/${message?.id}`)).toContain('<h1>Second</h1>');
  });

  it('shows what a message says as text, never as markup of its own', async () => {
    await send({ subject: '<script>alert(1)</script>', text: '</pre><img src=x onerror=alert(1)>' });
    const [message] = await messages();
    for (const page of [await pageText('/'), await pageText(`/messages/${message?.id}`)]) {
      expect(page).toContain('&lt;script&gt;');
      expect(page).not.toMatch(/<script|<img/);
    }
  });

  it('offers the links of a message that has only text', async () => {
    await send({ text: 'Read http://localhost:4310/e/abc?x=1&y=2 or javascript:alert(1)' });
    const [message] = await messages();
    const page = await pageText(`/messages/${message?.id}`);
    expect(page).toContain('href="http://localhost:4310/e/abc?x=1&amp;y=2"');
    expect(page).not.toContain('href="javascript:');
  });

  it('gives the HTML of a message in a sandbox that runs nothing', async () => {
    await send({ html: '<html><head></head><body><script>alert(1)</script></body></html>' });
    const [message] = await messages();
    const response = await fetch(`${fake.inboxUrl}/messages/${message?.id}/html`);
    const policy = response.headers.get('content-security-policy');
    expect(policy).toMatch(/^sandbox /);
    expect(policy).not.toContain('allow-scripts');
    expect(policy).toContain("default-src 'none'");
  });

  it('answers 404 for a message or file that is not there', async () => {
    await send();
    const [message] = await messages();
    for (const path of [
      '/messages/none',
      '/messages/none/html',
      `/messages/${message?.id}/attachments/3`,
      '/x',
    ]) {
      expect((await fetch(fake.inboxUrl + path)).status).toBe(404);
    }
  });
});

describe('faults a test orders', () => {
  it('reject the next messages, then no more', async () => {
    await planFaults({ reject: 1, rejectCode: 550 });
    await expect(send()).rejects.toMatchObject({ responseCode: 550 });
    await send();
    expect(await messages()).toHaveLength(1);
  });

  it('lose the answer to a kept message, so that the sender repeats it', async () => {
    await planFaults({ reject: 1, keepRejected: true });
    await expect(send({ messageId: '<r@cedar.test>' })).rejects.toMatchObject({ responseCode: 451 });
    await send({ messageId: '<r@cedar.test>' });
    expect((await messages()).map(({ deliveries }) => deliveries)).toEqual([2]);
  });

  it('delay the next message by the time ordered', async () => {
    await planFaults({ delay: 1, delayMs: 300 });
    const begun = performance.now();
    await send();
    expect(performance.now() - begun).toBeGreaterThanOrEqual(295);
  });
});

describe('the state file', () => {
  it('brings the messages back after a start, deliveries included', async () => {
    await send({ messageId: '<a@cedar.test>' });
    await send({ messageId: '<a@cedar.test>' });
    const before = await messages();
    await fake.stop();
    fake = await startMailFake({ stateFile });
    expect(await messages()).toEqual(before);
    expect(before[0]?.deliveries).toBe(2);
  });

  it('survives a last line cut short', async () => {
    await send();
    await fake.stop();
    const whole = readFileSync(stateFile, 'utf8');
    appendFileSync(stateFile, whole.slice(0, 40));
    fake = await startMailFake({ stateFile });
    expect(await messages()).toHaveLength(1);
  });
});
