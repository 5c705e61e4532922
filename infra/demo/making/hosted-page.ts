/**
 * Fills in one of the payment provider's hosted pages, as a person would in the browser. Only the stand-in has pages that
 * take a card by name; the demo is never made against the provider itself.
 *
 * @throws when the page refuses
 */
export async function submitHostedPage(url: string, form: Record<string, string>): Promise<void> {
  const answer = await fetch(url, { method: 'POST', redirect: 'manual', body: new URLSearchParams(form) });
  if (answer.status !== 303) throw new Error(`The payment page at ${url} answered ${answer.status}.`);
}
