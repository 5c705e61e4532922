import { ENTITIES } from '@bookmatch/api/entities';
import { readConfig } from '@bookmatch/api/platform/config/config';
import { openPlatform } from '@bookmatch/api/platform/platform';
import { makeDemo } from './make-demo.js';

/** Makes the demo shops unless they are there. Needs the API's own environment, with the payment stand-in running. */
const config = readConfig(process.env);
if (config.mode === 'production' || config.payments.api === '')
  throw new Error('The demo shops are made beside the payment stand-in only, never in production.');

const platform = await openPlatform(config, ENTITIES);
try {
  const summary = await makeDemo(platform, new Date());
  console.log(summary ?? 'The demo shops are there.');
} finally {
  await platform.close();
}
