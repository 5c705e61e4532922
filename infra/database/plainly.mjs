/** Does the work of a script; what goes wrong is told as one sentence, and the script ends with 1. */
export async function plainly(work) {
  try {
    await work();
  } catch (fault) {
    console.error(fault.message);
    process.exitCode = 1;
  }
}
