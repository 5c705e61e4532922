/** Signs in as the browser does and gives the cookies to send along. */
export async function signIn(origin: string, email: string, password: string): Promise<string> {
  const first = await fetch(`${origin}/api/openapi.json`);
  const csrf = cookiesOf(first)['bookmatch-csrf'] ?? '';
  const answer = await fetch(`${origin}/api/account/sign-in`, {
    method: 'POST',
    headers: {
      'content-type': 'application/json',
      origin,
      cookie: `bookmatch-csrf=${csrf}`,
      'x-csrf-token': decodeURIComponent(csrf),
    },
    body: JSON.stringify({ email, password }),
  });
  if (!answer.ok) throw new Error(`Could not sign in as ${email}: ${await answer.text()}`);
  const all = { 'bookmatch-csrf': csrf, ...cookiesOf(answer) };
  return Object.entries(all)
    .map(([name, value]) => `${name}=${value}`)
    .join('; ');
}

function cookiesOf(answer: Response): Record<string, string> {
  const cookies: Record<string, string> = {};
  for (const line of answer.headers.getSetCookie()) {
    const [, name = '', value = ''] = /^([^=]+)=([^;]*)/.exec(line) ?? [];
    cookies[name] = value;
  }
  return cookies;
}
