import type { TestApi } from './test-api.js';

type Message = { subject: string; text: string };

/** The secret of the link in a letter. */
export function tokenIn(letter: Message | undefined): string {
  const token = /token=([\w-]+)/.exec(letter?.text ?? '')?.[1];
  if (!token) throw new Error(`There is no link in: ${letter?.text ?? 'no letter'}`);
  return token;
}

/** The newest letter to an address whose subject has these words. */
export async function letterTo(api: TestApi, email: string, subject: string): Promise<Message | undefined> {
  return (await api.lettersTo(email)).filter((one) => one.subject.includes(subject)).at(-1);
}
