/** The ids that came of earlier acts, by name, for the acts that come after them. */
export class Trail {
  private ids = new Map<string, string>();

  keep(name: string, id: string): void {
    this.ids.set(name, id);
  }

  find(name: string): string | undefined {
    return this.ids.get(name);
  }

  id(name: string): string {
    const id = this.ids.get(name);
    if (id === undefined) throw new RangeError(`Nothing has made ${name} yet.`);
    return id;
  }

  /** What brings it back to how it is now: for a transaction that is undone and tried again. */
  bookmark(): () => void {
    const kept = new Map(this.ids);
    return () => {
      this.ids = new Map(kept);
    };
  }
}
