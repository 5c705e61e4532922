/** Thrown inside work that goes on although a stop was asked for. */
export class Stopped extends Error {}

/**
 * Remembers how to take back what was started, the last first. Once taking back has begun nothing new may start: what
 * is added later is taken back at once.
 */
export class Undo {
  #steps = [];
  #begun = false;

  get hasBegun() {
    return this.#begun;
  }

  /** Throws Stopped if taking back has begun: called before anything is started. */
  check() {
    if (this.#begun) throw new Stopped('stopped');
  }

  async add(undo) {
    this.#steps.push(undo);
    if (!this.#begun) return;
    await this.run();
    throw new Stopped('stopped');
  }

  /** Takes everything back. A step that fails is told and does not keep the others from being done. */
  async run() {
    this.#begun = true;
    for (let undo = this.#steps.pop(); undo; undo = this.#steps.pop()) {
      try {
        await undo();
      } catch (fault) {
        console.error(`While stopping: ${fault.message}`);
      }
    }
  }
}
