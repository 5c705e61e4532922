import { CommandFault, endCommands } from './commands.mjs';
import { say } from './say.mjs';
import { lastLines } from './service.mjs';
import { onStopAsked } from './stop-signals.mjs';
import { Stopped, Undo } from './undo.mjs';

/**
 * Runs the work, then stays until a signal (Ctrl-C, SIGTERM, SIGHUP) or a crash of something started; in every case
 * takes back all that was started and ends the process: with 0 when it was asked to stop, with 1 when something failed.
 *
 * @param work gets `undo` to note what it starts and `onCrash` to hand to it
 */
export async function runUntilStopped(work) {
  const undo = new Undo();
  const end = new Promise((resolve) => onStopAsked(() => resolve({ code: 0 })));
  let crashed;
  const crash = new Promise((resolve) => (crashed = resolve));
  const working = work({ undo, onCrash: (service) => crashed({ code: 1, service }) });
  const failure = working.then(
    () => new Promise(() => {}),
    (fault) => ({ code: 1, fault }),
  );
  // Without a timer the process would end while nothing but promises are waited for.
  const keepAlive = setInterval(() => {}, 60_000);
  const outcome = await Promise.race([end, crash, failure]);
  explain(outcome);
  await stopAll(undo, working, outcome.fault);
  clearInterval(keepAlive);
  process.exit(outcome.code);
}

async function stopAll(undo, working, explained) {
  say('Stopping …');
  await Promise.all([undo.run(), endCommands()]);
  await working.catch((fault) => {
    const isConsequence = fault instanceof Stopped || fault instanceof CommandFault;
    if (fault !== explained && !isConsequence) console.error(fault.message);
  });
  await undo.run();
  say('Stopped.');
}

function explain({ fault, service }) {
  if (service)
    console.error(
      `\nThe ${service.name} ${service.reason}. Its last lines:\n${lastLines(service.logFile)}\n`,
    );
  if (fault instanceof CommandFault) console.error(`\n${fault.output.trimEnd()}`);
  if (fault) console.error(`\n${fault.message}\n`);
}
