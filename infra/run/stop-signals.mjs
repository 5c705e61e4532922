import { commandLineOf, identityOf, isAlive, parentOf } from './processes.mjs';

/**
 * Calls back when this process is asked to stop: by a signal, or because npm, which runs it, is gone. npm passes a
 * signal on only to the shell between, and none at all when it is killed; what it leaves behind must not run for ever.
 */
export function onStopAsked(callback) {
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, callback);
  if (!process.env.npm_lifecycle_event) return;
  const above = processesAbove();
  const watch = setInterval(() => {
    if (above.every(isAlive)) return;
    clearInterval(watch);
    callback();
  }, 500);
  watch.unref();
}

/** npm itself, and the shell between if npm's shell did not give its place to us. */
function processesAbove() {
  const parent = process.ppid;
  const isShell = /^(\S*\/)?(sh|dash|bash) -c /.test(commandLineOf(parent));
  return [parent, ...(isShell ? [parentOf(parent)] : [])].map(identityOf);
}
