import { Router } from 'express';
import type { Provider } from '../provider.js';
import { FAULT_KINDS } from '../wire/faults.js';
import { needed, Reader } from './read.js';

/** Sets and clears what goes wrong with the next API calls. */
export function faultRoutes(provider: Provider): Router {
  const router = Router();
  router.post('/faults', (request, response) => {
    const reader = new Reader(request.body);
    const fault = {
      kind: needed(reader.oneOf('kind', FAULT_KINDS), 'kind'),
      calls: reader.integer('calls') ?? 1,
      delayMs: reader.integer('delayMs') ?? 0,
      method: reader.text('method'),
      path: reader.text('path'),
    };
    reader.end();
    provider.faults.set(fault);
    response.json({ ok: true });
  });
  router.delete('/faults', (_request, response) => {
    provider.faults.clear();
    response.json({ ok: true });
  });
  return router;
}
