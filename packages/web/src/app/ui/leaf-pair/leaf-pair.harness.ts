import { ComponentHarness, parallel } from '@angular/cdk/testing';

/** Reads a `bm-leaf-pair` as the table that it is. */
export class LeafPairHarness extends ComponentHarness {
  static readonly hostSelector = 'bm-leaf-pair';

  /** Name, planned, built and difference of every row, the total last. */
  async lines(): Promise<[string, string, string, string][]> {
    const [names, planned, built, differences] = await parallel(() => [
      this.texts('tbody .spine, tfoot .spine'),
      this.texts('.planned .figure'),
      this.texts('.built .figure'),
      this.texts('tbody .difference, tfoot .difference'),
    ]);
    return names.map((name, at) => [name, planned[at] ?? '', built[at] ?? '', differences[at] ?? '']);
  }

  async openWorking(row: number): Promise<void> {
    const buttons = await this.locatorForAll('button.opens')();
    await buttons[row]?.click();
  }

  private async texts(selector: string): Promise<string[]> {
    const elements = await this.locatorForAll(selector)();
    return Promise.all(elements.map((element) => element.text()));
  }
}
