import { html, type Html } from './html.js';

export const NOTICE = 'Test payment page - no real card is charged';

/** A whole page: the notice that nothing here is real, one heading, the content. */
export function page(title: string, content: Html): string {
  return html`<!doctype html>
    <html lang="en">
      <head>
        <meta charset="utf-8" />
        <meta name="viewport" content="width=device-width, initial-scale=1" />
        <title>${title} - test payments</title>
        <link rel="stylesheet" href="/page.css" />
      </head>
      <body>
        <header><p class="notice">${NOTICE}</p></header>
        <main>
          <h1>${title}</h1>
          ${content}
        </main>
      </body>
    </html> `.text;
}

/** A message that is read out as soon as the page is there. */
export function alert(message: string | null): Html | null {
  return message === null ? null : html`<p class="alert" role="alert">${message}</p>`;
}
