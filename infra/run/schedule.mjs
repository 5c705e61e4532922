/**
 * Runs checks side by side, no more at once than the cores carry, each after those it names.
 *
 * @param run does one check and gives its result; must not throw
 * @param cores a check heavier than that runs alone
 * @returns the results by the checks' names
 */
export async function runSideBySide(checks, cores, run) {
  const results = new Map();
  const running = new Map();
  const waiting = [...checks];
  let free = cores;

  while (waiting.length > 0 || running.size > 0) {
    const next = waiting.findIndex((check) => isReady(check) && weightOf(check) <= free);
    if (next >= 0) start(...waiting.splice(next, 1));
    else await Promise.race(running.values());
  }
  return results;

  function isReady({ after = [] }) {
    return after.every((name) => results.has(name) || !checks.some((check) => check.name === name));
  }

  function weightOf({ weight = 1 }) {
    return Math.min(weight, cores);
  }

  function start(check) {
    free -= weightOf(check);
    const done = run(check, results).then((result) => {
      results.set(check.name, result);
      running.delete(check.name);
      free += weightOf(check);
    });
    running.set(check.name, done);
  }
}
