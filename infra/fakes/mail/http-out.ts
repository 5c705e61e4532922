import express, { type Express, type Request, type Response } from 'express';
import type { Faults, PlannedFaults } from './faults.js';
import { inboxStyle, listPage, messagePage, missingPage } from './inbox-pages.js';
import type { Mailbox, MailboxFilter } from './mailbox.js';
import { toMessageJson } from './message-json.js';
import type { KeptMessage } from './message.js';

const pagePolicy =
  "default-src 'none'; style-src 'self'; frame-src 'self'; form-action 'self'; base-uri 'none'";
const mailPolicy =
  "sandbox allow-popups allow-popups-to-escape-sandbox allow-top-navigation-by-user-activation; default-src 'none'; img-src data:; style-src 'unsafe-inline'";

/** The side that shows what came in: pages for people, JSON for tests. */
export function makeInboxApp(mailbox: Mailbox, faults: Faults): Express {
  const app = express();
  app.disable('x-powered-by');
  app.use((_request, response, next) => {
    response.set({
      'Content-Security-Policy': pagePolicy,
      'X-Content-Type-Options': 'nosniff',
      'Cache-Control': 'no-store',
    });
    next();
  });
  addPages(app, mailbox);
  addMessagesApi(app, mailbox);
  addFaultsApi(app, faults);
  app.use((_request, response) => void response.status(404).send(missingPage()));
  return app;
}

function addPages(app: Express, mailbox: Mailbox): void {
  app.get('/inbox.css', (_request, response) => void response.type('css').send(inboxStyle));
  app.get('/', (request, response) => {
    const filter = filterOf(request);
    response.send(listPage(mailbox.list(filter), filter));
  });
  app.get(
    '/messages/:id',
    withMessage(mailbox, (message, response) => void response.send(messagePage(message))),
  );
  app.get('/messages/:id/html', withMessage(mailbox, sendMailHtml));
  app.get('/messages/:id/attachments/:index', withMessage(mailbox, sendAttachment));
}

function addMessagesApi(app: Express, mailbox: Mailbox): void {
  app.get('/api/messages', (request, response) => {
    response.json({ messages: mailbox.list(filterOf(request)).map(toMessageJson) });
  });
  app.get(
    '/api/messages/:id',
    withMessage(mailbox, (message, response) => void response.json(toMessageJson(message))),
  );
  app.delete('/api/messages', (_request, response) => {
    mailbox.clear();
    response.status(204).end();
  });
}

function addFaultsApi(app: Express, faults: Faults): void {
  app.get('/api/faults', (_request, response) => void response.json(faults.remaining()));
  app.put(
    '/api/faults',
    express.json(),
    (request: Request<object, unknown, Partial<PlannedFaults>>, response) => {
      faults.plan(request.body);
      response.json(faults.remaining());
    },
  );
  app.delete('/api/faults', (_request, response) => {
    faults.plan({});
    response.status(204).end();
  });
}

function filterOf({ query }: Request): MailboxFilter {
  return { to: textOf(query.to), subject: textOf(query.subject), since: textOf(query.since) };
}

function textOf(value: unknown): string | undefined {
  return typeof value === 'string' && value !== '' ? value : undefined;
}

type Answer = (message: KeptMessage, response: Response, request: Request) => void;

function withMessage(mailbox: Mailbox, answer: Answer) {
  return (request: Request<{ id: string }>, response: Response): void => {
    const message = mailbox.find(request.params.id);
    if (message) answer(message, response, request);
    else response.status(404).send(missingPage());
  };
}

/** The message's own HTML runs nothing and loads nothing; its links open in the whole window. */
function sendMailHtml(message: KeptMessage, response: Response): void {
  const base = '<base target="_top">';
  const inHead = message.html.replace(/<head[^>]*>/i, (head) => head + base);
  response
    .set('Content-Security-Policy', mailPolicy)
    .type('html')
    .send(inHead === message.html ? base + message.html : inHead);
}

function sendAttachment(message: KeptMessage, response: Response, request: Request): void {
  const attachment = message.attachments[Number(request.params.index)];
  if (!attachment) {
    response.status(404).send(missingPage());
    return;
  }
  response.attachment(attachment.name).type(attachment.contentType);
  response.send(Buffer.from(attachment.contentBase64, 'base64'));
}
