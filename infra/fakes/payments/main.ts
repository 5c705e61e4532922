import { optionsFromEnvironment } from './environment.js';
import { startPaymentsFake } from './start.js';

const fake = await startPaymentsFake(optionsFromEnvironment(process.env));
console.log(`Payments fake at ${fake.url}`);

let closing = false;
for (const signal of ['SIGTERM', 'SIGINT'] as const) {
  process.on(signal, () => {
    if (closing) return;
    closing = true;
    void fake.close().then(() => process.exit(0));
  });
}
