import { connect } from 'node:net';
import { setTimeout as pause } from 'node:timers/promises';

/** Whether a MariaDB server on this loopback port greets, which it does only once its init file has been run. */
export function greets(port, withinMs = 1_000) {
  return new Promise((resolve) => {
    const socket = connect({ port, host: '127.0.0.1' });
    const answer = (value) => {
      socket.destroy();
      resolve(value);
    };
    socket.setTimeout(withinMs, () => answer(false));
    socket.once('data', (packet) => answer(packet.includes('MariaDB')));
    socket.once('error', () => answer(false));
    socket.once('close', () => answer(false));
  });
}

/** Waits until the server greets; false when it gave up first or the time (milliseconds) ran out. */
export async function waitForGreeting(port, { withinMs, hasGivenUp }) {
  const until = Date.now() + withinMs;
  while (Date.now() < until && !hasGivenUp()) {
    if (await greets(port)) return true;
    await pause(25);
  }
  return false;
}
