import { join } from 'node:path';
import { rootFolder } from './places.mjs';

const loopback = '127.0.0.1';

/** The configuration of the API on this machine: its own database, both fakes, files in its folder. */
export function apiEnvironment({ folder, ports, database, secrets, mode }) {
  const { database: name, application } = database.credentials;
  return {
    NODE_ENV: mode === 'test' ? 'test' : 'development',
    BOOKMATCH_MODE: mode,
    BOOKMATCH_HOST: loopback,
    BOOKMATCH_PORT: String(ports.web),
    BOOKMATCH_ORIGIN: `http://localhost:${ports.web}`,
    BOOKMATCH_WEB_ROOT: join(rootFolder, 'packages/web/dist/web'),
    BOOKMATCH_SECRET: secrets.application,
    BOOKMATCH_DB_HOST: loopback,
    BOOKMATCH_DB_PORT: String(database.port),
    BOOKMATCH_DB_NAME: name,
    BOOKMATCH_DB_USER: application.user,
    BOOKMATCH_DB_PASSWORD: application.password,
    BOOKMATCH_FILES_DIR: join(folder, 'files'),
    BOOKMATCH_MAIL_HOST: loopback,
    BOOKMATCH_MAIL_PORT: String(ports.smtp),
    BOOKMATCH_MAIL_TLS: 'off',
    BOOKMATCH_MAIL_FROM: 'post@bookmatch.test',
    BOOKMATCH_PAYMENTS_KEY: secrets.paymentsKey,
    BOOKMATCH_PAYMENTS_WEBHOOK_SECRET: secrets.paymentsWebhook,
    BOOKMATCH_PAYMENTS_PRICE: 'price_bookmatch_member_month',
    BOOKMATCH_PAYMENTS_API: `http://${loopback}:${ports.payments}`,
  };
}

/** What the migrations need besides: the account that may change the schema. The running API never gets it. */
export function migrationEnvironment({ credentials: { owner, application } }) {
  return {
    BOOKMATCH_DB_OWNER_USER: owner.user,
    BOOKMATCH_DB_OWNER_PASSWORD: owner.password,
    BOOKMATCH_DB_APPLICATION_USER: application.user,
  };
}

/** The configuration of the fake payment provider. */
export function paymentsFakeEnvironment({ folder, ports, secrets }) {
  return {
    PAYMENTS_FAKE_PORT: String(ports.payments),
    PAYMENTS_FAKE_HOST: loopback,
    PAYMENTS_FAKE_KEY: secrets.paymentsKey,
    PAYMENTS_FAKE_WEBHOOK_URL: `http://${loopback}:${ports.web}/api/webhooks/payments`,
    PAYMENTS_FAKE_WEBHOOK_SECRET: secrets.paymentsWebhook,
    PAYMENTS_FAKE_STATE_FILE: join(folder, 'payments-fake.json'),
  };
}

/** The configuration of the fake mail service. */
export function mailFakeEnvironment({ folder, ports }) {
  return {
    MAIL_FAKE_SMTP_PORT: String(ports.smtp),
    MAIL_FAKE_HTTP_PORT: String(ports.inbox),
    MAIL_FAKE_STATE_FILE: join(folder, 'mail-fake.jsonl'),
  };
}
