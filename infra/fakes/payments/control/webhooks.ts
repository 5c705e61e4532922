import { Router, type Request } from 'express';
import type { Provider } from '../provider.js';
import type { Endpoint } from '../webhooks/endpoint.js';
import { MODE_NAMES, type DeliveryMode } from '../webhooks/mode.js';
import { resend } from '../webhooks/resend.js';
import { invalid, noSuch } from '../wire/error.js';
import { needed, Reader } from './read.js';

/** Receivers, the way events travel, and sending them again. */
export function webhookRoutes(provider: Provider): Router {
  const router = Router();
  router.put('/webhooks', (request, response) => {
    const reader = new Reader(request.body);
    const endpoints = needed(reader.list('endpoints'), 'endpoints').map(endpointFrom);
    reader.end();
    provider.state.endpoints = endpoints;
    provider.changed();
    response.json({ ok: true });
  });
  router.put('/delivery', (request, response) => {
    provider.outbox.setMode(modeFrom(request.body));
    response.json({ ok: true });
  });
  router.post('/flush', async (request, response) => {
    const reader = new Reader(request.body);
    const order = reader.oneOf('order', ['given', 'reverse']) ?? 'given';
    reader.end();
    response.json({ deliveries: await provider.outbox.flush(order) });
  });
  router.get('/events', (request, response) => void response.json({ events: eventsFor(provider, request) }));
  router.get('/deliveries', (_request, response) => {
    response.json({ deliveries: provider.state.deliveries });
  });
  router.post('/events/:id/resend', async (request, response) => {
    response.json({ statuses: await resendFrom(provider, request.params.id, request.body) });
  });
  return router;
}

function endpointFrom(value: unknown): Endpoint {
  const reader = new Reader(value);
  const endpoint = {
    url: needed(reader.text('url'), 'url'),
    secret: needed(reader.text('secret'), 'secret'),
    sends: reader.oneOf('sends', ['all', 'platform', 'connected']) ?? 'all',
  };
  reader.end();
  if (!/^https?:\/\//.test(endpoint.url) || !URL.canParse(endpoint.url)) throw invalid('Invalid url', 'url');
  return endpoint;
}

function modeFrom(body: unknown): DeliveryMode {
  const reader = new Reader(body);
  const mode = {
    name: needed(reader.oneOf('mode', MODE_NAMES), 'mode'),
    copies: reader.integer('copies') ?? 2,
    delayMs: reader.integer('delayMs') ?? 200,
    types: (reader.list('types') ?? []).map(String),
  };
  reader.end();
  return mode;
}

/** Optionally only those of one type, or about one object. */
function eventsFor(provider: Provider, request: Request): unknown[] {
  const { type, object } = request.query;
  return provider.state.events.filter((event) => {
    if (type !== undefined && event.type !== type) return false;
    return object === undefined || (event.data.object as { id?: unknown }).id === object;
  });
}

async function resendFrom(provider: Provider, id: string, body: unknown): Promise<number[]> {
  const event = provider.state.events.find((one) => one.id === id);
  if (event === undefined) throw noSuch('event', id, 'id', 404);
  const reader = new Reader(body);
  const options = {
    copies: reader.integer('copies') ?? 1,
    parallel: reader.flag('parallel') ?? false,
    signedSecondsAgo: reader.integer('signedSecondsAgo') ?? 0,
    secret: reader.text('secret'),
    tampered: reader.flag('tampered') ?? false,
  };
  reader.end();
  return resend(event, provider.outbox.receiversOf(event.account ?? null), options);
}
