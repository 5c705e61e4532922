import { CommandFault, endCommands } from './commands.mjs';
import { say } from './say.mjs';
import { lastLines } from './service.mjs';
import { onStopAsked } from './stop-signals.mjs';
import { Stopped, Undo } from './undo.mjs';

/**
 * Runs the work, then stays until a signal (Ctrl-C, SIGTERM, SIGHUP) or a crash of something started; in every case
 * takes back all that was started and ends the process: with 1 when something failed, and when it was asked to stop with
 * the code for that, 0 unless given.
 *
 * @param work gets `undo` to note what it starts and `onCrash` to hand to it. When it gives `{ code, lastLine }` it is
 *   finished: the process ends with that code and prints that line last.
 */
export async function runUntilStopped(work, { codeWhenAsked = 0 } = {}) {
  const undo = new Undo();
  const asked = new Promise((resolve) => onStopAsked(() => resolve({ code: codeWhenAsked, isAsked: true })));
  let crashed;
  const crash = new Promise((resolve) => (crashed = resolve));
  const working = work({ undo, onCrash: (service) => crashed({ code: 1, service }) });
  const end = working.then(
    (result) => result ?? new Promise(() => {}),
    (fault) => ({ code: 1, fault }),
  );
  // Without a timer the process would end while nothing but promises are waited for.
  const keepAlive = setInterval(() => {}, 60_000);
  const outcome = await Promise.race([asked, crash, end]);
  await stopAll({ outcome, undo, working });
  clearInterval(keepAlive);
  process.exit(outcome.code);
}

async function stopAll({ outcome, undo, working }) {
  explain(outcome);
  if (!outcome.lastLine) say('Stopping …');
  await Promise.all([undo.run(), endCommands()]);
  if (outcome.isAsked || outcome.service) await waitForItsEnd(working, undo);
  say(outcome.lastLine ?? 'Stopped.');
}

/** Work that was interrupted meets a stopped command or a closed way on; whatever it still started is taken back. */
async function waitForItsEnd(working, undo) {
  await working.catch((fault) => {
    const isConsequence = fault instanceof Stopped || fault instanceof CommandFault;
    if (!isConsequence) console.error(fault.message);
  });
  await undo.run();
}

function explain({ fault, service }) {
  if (service)
    console.error(
      `\nThe ${service.name} ${service.reason}. Its last lines:\n${lastLines(service.logFile)}\n`,
    );
  if (fault instanceof CommandFault) console.error(`\n${fault.output.trimEnd()}`);
  if (fault) console.error(`\n${fault.message}\n`);
}
