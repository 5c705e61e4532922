import { html, type SafeHtml } from './html-text.js';
import { inboxStyle } from './inbox-style.js';
import type { MailboxFilter } from './mailbox.js';
import { attachmentPath, linksOf } from './message-json.js';
import type { KeptMessage } from './message.js';

/** The list, newest first, with a filter by recipient and subject. */
export function listPage(messages: KeptMessage[], filter: MailboxFilter): string {
  return page(
    'Test mail',
    html`<h1>Test mail</h1>
      ${filterForm(filter)}
      <p class="quiet" role="status">${messages.length} ${messages.length === 1 ? 'message' : 'messages'}</p>
      <div class="panel">${messages.length > 0 ? mailList(messages) : emptyList()}</div>`,
  );
}

/** One message: who, what, its text, its HTML in a sandbox, and the files. */
export function messagePage(message: KeptMessage): string {
  const title = message.subject || 'Without a subject';
  return page(
    title,
    html`<p class="bar"><a href="/">All messages</a></p>
      <h1>${title}</h1>
      <div class="panel padded">${facts(message)}</div>
      ${attachments(message)} ${message.html ? formatted(message) : links(message)}
      <h2>As plain text</h2>
      <div class="panel padded"><pre>${message.text || 'This message has no text.'}</pre></div>`,
  );
}

/** What a wrong address shows. */
export function missingPage(): string {
  return page(
    'Not here',
    html`<h1>This message is not here</h1>
      <p>It may have been deleted. <a href="/">All messages</a></p>`,
  );
}

function page(title: string, body: SafeHtml): string {
  const document = html`<!doctype html>
    <html lang="en">
      <head>
        <meta charset="utf-8" />
        <meta name="viewport" content="width=device-width, initial-scale=1" />
        <title>${title} - Bookmatch test mail</title>
        <link rel="stylesheet" href="/inbox.css" />
      </head>
      <body>
        <main>
          <p class="note">
            This is a test inbox. Mail sent by Bookmatch on this machine ends here and goes no further.
          </p>
          ${body}
        </main>
      </body>
    </html>`;
  return document.source;
}

export { inboxStyle };

function filterForm({ to = '', subject = '' }: MailboxFilter): SafeHtml {
  return html`<form class="bar" method="get" action="/" role="search">
    <label>To <input name="to" value="${to}" autocomplete="off" /></label>
    <label>Subject <input name="subject" value="${subject}" autocomplete="off" /></label>
    <button>Look</button>
    <a href="/">Show all</a>
  </form>`;
}

function mailList(messages: KeptMessage[]): SafeHtml {
  return html`<ul class="mails">
    ${messages.map(
      (message) =>
        html`<li>
          <a href="/messages/${message.id}">
            <strong>${message.subject || 'Without a subject'}</strong>
            <span class="quiet">To ${message.to.join(', ')} · ${when(message)}${files(message)}</span>
          </a>
        </li>`,
    )}
  </ul>`;
}

function emptyList(): SafeHtml {
  return html`<p class="padded">
    Nothing here yet. Mail appears as soon as Bookmatch sends some: load this page again.
  </p>`;
}

function facts(message: KeptMessage): SafeHtml {
  return html`<dl>
    <dt>From</dt>
    <dd>${message.from}</dd>
    <dt>To</dt>
    <dd>${message.to.join(', ')}</dd>
    <dt>Answers to</dt>
    <dd>${message.replyTo || message.from}</dd>
    <dt>Received</dt>
    <dd>${when(message)}${message.deliveries > 1 ? `, delivered ${message.deliveries} times` : ''}</dd>
  </dl>`;
}

function attachments({ id, attachments: files }: KeptMessage): SafeHtml {
  if (files.length === 0) return html``;
  return html`<h2>Files</h2>
    <ul class="panel mails">
      ${files.map(
        ({ name, sizeBytes }, index) =>
          html`<li>
            <a href="${attachmentPath(id, index)}" download>
              <strong>${name}</strong><span class="quiet">${Math.ceil(sizeBytes / 1024)} kB</span>
            </a>
          </li>`,
      )}
    </ul>`;
}

function formatted({ id }: KeptMessage): SafeHtml {
  return html`<h2>As the reader sees it</h2>
    <div class="panel">
      <iframe
        title="The message as the reader sees it"
        src="/messages/${id}/html"
        sandbox="allow-popups allow-popups-to-escape-sandbox allow-top-navigation-by-user-activation"
      ></iframe>
    </div>`;
}

/** Plain text cannot be clicked. */
function links(message: KeptMessage): SafeHtml {
  const found = linksOf(message);
  if (found.length === 0) return html``;
  return html`<h2>Links</h2>
    <ul class="panel mails">
      ${found.map((link) => html`<li><a href="${link}">${link}</a></li>`)}
    </ul>`;
}

function files({ attachments: { length } }: KeptMessage): string {
  return length === 0 ? '' : ` · ${length} ${length === 1 ? 'file' : 'files'}`;
}

function when({ receivedAt }: KeptMessage): string {
  return `${receivedAt.slice(0, 10)} ${receivedAt.slice(11, 19)} UTC`;
}
