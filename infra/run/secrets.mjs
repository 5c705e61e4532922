import { randomBytes } from 'node:crypto';
import { join } from 'node:path';
import { readJson, writePrivateJson } from './private-file.mjs';

/** The secrets of a local run, random and kept, so that sessions and links outlive a restart. */
export function readOrMakeSecrets(folder) {
  const file = join(folder, 'secrets.json');
  const secrets = {
    application: random(),
    paymentsKey: `sk_test_${random()}`,
    paymentsWebhook: `whsec_${random()}`,
    ...readJson(file),
  };
  writePrivateJson(file, secrets);
  return secrets;
}

function random() {
  return randomBytes(32).toString('hex');
}
