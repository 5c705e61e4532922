import type { Express } from 'express';
import type { DataSource } from 'typeorm';
import { sendProblem } from './problem-handler.js';
import { ProblemError } from './problem-error.js';

/** `health`: the process answers. `ready`: it may be sent traffic; false while it starts or shuts down. */
export function mountHealth(app: Express, dataSource: DataSource, isOpen: () => boolean): void {
  app.get('/api/health', (_request, response) => {
    response.json({ status: 'ok' });
  });
  app.get('/api/ready', async (request, response) => {
    const answered =
      isOpen() &&
      (await dataSource.query('select 1').then(
        () => true,
        () => false,
      ));
    if (answered) response.json({ status: 'ready' });
    else sendProblem(response, new ProblemError('not-ready', 'Not ready yet.'), String(request.id));
  });
}
