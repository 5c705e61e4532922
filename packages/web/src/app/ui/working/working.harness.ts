import { ComponentHarness, type TestKey } from '@angular/cdk/testing';

/** Opens and reads the working of a figure. */
export class WorkingHarness extends ComponentHarness {
  static readonly hostSelector = 'bm-working';

  private readonly figure = this.locatorFor('button.figure');
  private readonly root = this.documentRootLocatorFactory();

  async figureText(): Promise<string> {
    return (await this.figure()).text();
  }

  async press(): Promise<void> {
    await (await this.figure()).click();
  }

  /** The cells of each line, the total last; null while it is closed. */
  async lines(): Promise<string[][] | null> {
    if (!(await this.root.locatorForOptional('.sheet')())) return null;
    const cells = await this.root.locatorForAll('.sheet td')();
    const texts = await Promise.all(
      cells.map(async (cell) => (await cell.text()).replace(/\s+/g, ' ').trim()),
    );
    return Array.from({ length: texts.length / 2 }, (_, row) => texts.slice(row * 2, row * 2 + 2));
  }

  async close(): Promise<void> {
    await (await this.root.locatorFor('.sheet button')()).click();
  }

  async sendKeys(key: TestKey): Promise<void> {
    await (await this.root.locatorFor('.sheet button')()).sendKeys(key);
  }
}
