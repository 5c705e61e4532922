import { expect, test, type Page } from '@playwright/test';
import { expectAccessible } from './support/accessible';
import { run } from './support/errand';
import { clockIn, clockOn, clockOut } from './support/phone-clock';
import { invite, join, phone, shopRoot, signUp, somebody } from './support/people';
import { addJob } from './support/workplace';

type Entry = { operationName: string; endedAt: string | null };
const GLOVE_PX = 56;
const [first, second, third] = ['Cut sheet goods', 'Face frames', 'Assemble boxes'] as const;

test('a day on the phone, with and without a network', async ({ page, browser }) => {
  const tamsin = somebody('Tamsin Rook');
  await signUp(page, { shop: 'Copperbeech Cabinets', ...somebody('Aldo Reyes') });
  const hours = { [first]: 6, [second]: 4, [third]: 2 };
  await addJob(page, { title: 'Boot room lockers', customer: 'Piers Alder', hours });
  await invite(page, tamsin, 'Crew');
  const hand = await phone(browser);
  await join(hand, tamsin);

  await test.step('clock in and switch', async () => {
    await hand.getByRole('link', { name: 'Clock', exact: true }).click();
    await expect(clockOn(hand)).toContainText('Not clocked in');
    await clockIn(hand, 'Boot room lockers', first);
    await clockIn(hand, 'Boot room lockers', second);
    await expect.poll(() => worked(page)).toEqual([`${first}, ended`, `${second}, runs`]);
    await expectAccessible(hand, 'the phone clock');
    await expectGloveSized(hand);
  });

  await test.step('no network: clock out, and in to something else', async () => {
    await hand.context().setOffline(true);
    await clockOut(hand);
    await expect(hand.getByText('No network. 1 punch is kept on this device')).toBeVisible();
    await clockIn(hand, 'Boot room lockers', third);
    await expect(hand.getByText('No network. 2 punches are kept on this device')).toBeVisible();
    await expectGloveSized(hand);
    expect(await worked(page)).toEqual([`${first}, ended`, `${second}, runs`]);
  });

  await test.step('loading the page again loses no punch', async () => {
    const punches = /\/time\/(clock-in|entries\/[^/]+\/clock-out)$/;
    await hand.route(punches, (route) => route.abort('connectionreset'));
    await hand.context().setOffline(false);
    await hand.reload();
    await expect(hand.getByText('2 punches are kept on this device')).toBeVisible();
    await expect(clockOn(hand)).toContainText(third);
    expect(await worked(page)).toEqual([`${first}, ended`, `${second}, runs`]);
    await hand.unroute(punches);
  });

  await test.step('back on the network all of it settles, once and in order', async () => {
    await hand.context().setOffline(true);
    await hand.context().setOffline(false);
    await expect.poll(() => worked(page)).toEqual([`${first}, ended`, `${second}, ended`, `${third}, runs`]);
    await expect(hand.getByText('kept on this device')).toHaveCount(0);
    await expect(clockOn(hand)).toContainText(third);
    await clockOut(hand);
    await expect.poll(() => worked(page)).toEqual([`${first}, ended`, `${second}, ended`, `${third}, ended`]);
  });
});

/** What the server has, oldest first: its list begins with the newest. */
async function worked(owner: Page): Promise<string[]> {
  const { rows } = await run<{ rows: Entry[] }>(owner, '/time/entries');
  return rows
    .toReversed()
    .map(({ operationName, endedAt }) => `${operationName}, ${endedAt === null ? 'runs' : 'ended'}`);
}

/** Everything to be pressed on the screen is large enough for a glove. */
async function expectGloveSized(hand: Page): Promise<void> {
  const small: string[] = [];
  for (const target of await hand.getByRole('main').locator('button:visible, a:visible').all()) {
    const box = await target.boundingBox();
    if (!box || box.height < GLOVE_PX || box.width < GLOVE_PX)
      small.push(`${await target.innerText()}: ${box?.width} by ${box?.height}`);
  }
  expect(small, shopRoot(hand)).toEqual([]);
}
