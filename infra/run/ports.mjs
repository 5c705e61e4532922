import { createServer } from 'node:net';

/** Whether nobody listens on this loopback port right now. */
export function isPortFree(port) {
  return new Promise((resolve) => {
    const probe = createServer();
    probe.once('error', () => resolve(false));
    probe.listen({ port, host: '127.0.0.1', exclusive: true }, () => probe.close(() => resolve(true)));
  });
}

/** A loopback port nobody listens on, chosen by the system. */
export function anyFreePort() {
  return new Promise((resolve, reject) => {
    const probe = createServer();
    probe.once('error', reject);
    probe.listen({ port: 0, host: '127.0.0.1' }, () => {
      const { port } = probe.address();
      probe.close(() => resolve(port));
    });
  });
}

/** The wanted port if it is free, else the next free one within a hundred, else any. */
export async function freePortFrom(wanted) {
  for (let port = wanted; port < Math.min(wanted + 100, 65_536); port += 1) {
    if (await isPortFree(port)) return port;
  }
  return anyFreePort();
}

/** The port of last time if it is still free, else any free one, so that addresses stay the same between starts. */
export async function rememberedOrFreePort(remembered) {
  return Number.isInteger(remembered) && (await isPortFree(remembered)) ? remembered : anyFreePort();
}
