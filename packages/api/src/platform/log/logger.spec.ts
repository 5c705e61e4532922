import { QueryFailedError } from 'typeorm';
import { problemHandler } from '../http/problem-handler.js';
import { createLogger } from './logger.js';

/** What was logged, as the lines of text that leave the process. */
function noted() {
  const lines: string[] = [];
  return { lines, log: createLogger('info', { write: (line: string) => void lines.push(line) }) };
}
const SECRET = 'https://example.test/reset-password?token=4f9d';

describe('the log', () => {
  it('says which statement failed and why, and none of the values it carried', () => {
    const { lines, log } = noted();
    const driver = Object.assign(new Error('Data too long for column `kind`'), { sql: `insert '${SECRET}'` });
    log.error({ err: new QueryFailedError('insert into outbox_message', [SECRET], driver) }, 'fault');
    expect(lines.join('')).not.toContain(SECRET);
    const { err } = JSON.parse(lines[0]!) as { err: Record<string, unknown> };
    expect(err).toMatchObject({ type: 'QueryFailedError', message: 'Data too long for column `kind`' });
    expect(err['stack']).toContain('logger.spec');
  });

  it('masks a customer’s link also where a fault is logged', () => {
    const { lines, log } = noted();
    const response = {
      headersSent: false,
      status: () => response,
      set: () => response,
      type: () => response,
    };
    const sent = Object.assign(response, { send: () => undefined });
    const request = { id: 'r-1', originalUrl: '/api/links/SECRETSECRET/accept?token=SECRET&x=1' };
    problemHandler(log)(new TypeError('broken'), request as never, sent as never, () => undefined);
    expect(lines.join('')).not.toContain('SECRET');
    expect(JSON.parse(lines[0]!)).toMatchObject({ url: '/api/links/[masked]/accept?token=[masked]&x=1' });
  });
});
