/** Says one line. */
export function say(text) {
  console.log(text);
}

/** Says what is being done, does it, and says how long it took when that was worth a second. */
export async function step(text, work) {
  say(`${text} …`);
  const begun = performance.now();
  const result = await work();
  const took = performance.now() - begun;
  if (took >= 1_000) say(`  ${text}: done in ${seconds(took)}`);
  return result;
}

/** Milliseconds as seconds with one decimal, such as `3.4 s`. */
export function seconds(ms) {
  return `${(ms / 1000).toFixed(1)} s`;
}
