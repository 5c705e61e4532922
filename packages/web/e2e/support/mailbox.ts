import { expect } from '@playwright/test';

type Letter = { subject: string; text: string; attachments: { name: string; contentType: string }[] };

/** Waits for a letter in the mail fake and answers the newest one to the address that has the words in its subject. */
export async function letterTo(address: string, subject: string): Promise<Letter> {
  const url = new URL('/api/messages', process.env['BOOKMATCH_E2E_MAIL']);
  url.searchParams.set('to', address);
  url.searchParams.set('subject', subject);
  let found: Letter | undefined;
  await expect
    .poll(async () => (found = (await readLetters(url))[0]) !== undefined, {
      message: `a letter "${subject}" to ${address}`,
      timeout: 30_000,
    })
    .toBe(true);
  return found as unknown as Letter;
}

/** The first link in a letter whose address holds the given part. */
export function linkIn(letter: Letter, part: string): string {
  const link = letter.text.match(/https?:\/\/\S+/g)?.find((one) => one.includes(part));
  expect(link, `a link with ${part} in the letter "${letter.subject}"`).toBeTruthy();
  return link as string;
}

async function readLetters(url: URL): Promise<Letter[]> {
  const answer = await fetch(url);
  const body = (await answer.json()) as Letter[] | { messages: Letter[] };
  return Array.isArray(body) ? body : body.messages;
}
