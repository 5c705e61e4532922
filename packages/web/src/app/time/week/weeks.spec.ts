import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { TestBed } from '@angular/core/testing';
import { MatButtonHarness } from '@angular/material/button/testing';
import { MatDialogHarness } from '@angular/material/dialog/testing';
import { MatInputHarness } from '@angular/material/input/testing';
import { MatMenuHarness } from '@angular/material/menu/testing';
import { Router } from '@angular/router';
import { buildTimeEntry, buildTimeEntryRow } from '@bookmatch/common/testing/build-time-entry';
import type { Role } from '@bookmatch/common/access/roles';
import { buildMembership } from '../../testing/session';
import { openShopScreen } from '../../testing/shop-screen';
import { DataTableHarness } from '../../ui/data-table/data-table.harness';
import { buildJobs, FRAMES } from '../testing/build-punch';
import { buildMemberWeek, buildShopWeek, buildShopWeekRow, MEMBER_ID } from '../testing/build-week';
import { shopZone } from '../testing/shop-zone';
import timeRoutes from '../time.routes';

const OF = '?of=2027-01-13';
const entry = buildTimeEntryRow({
  ...{ id: FRAMES.entry, memberId: MEMBER_ID, jobId: FRAMES.job, operationId: FRAMES.operation },
  ...{ startedAt: '2027-01-12T14:31:00.000Z', endedAt: '2027-01-12T16:45:00.000Z' },
});

async function open(url: string, role: Role = 'owner') {
  const screen = await openShopScreen(
    [{ path: 'time', children: timeRoutes }],
    url,
    buildMembership({ role }),
    [shopZone],
  );
  const loader = TestbedHarnessEnvironment.loader(screen.fixture);
  const root = TestbedHarnessEnvironment.documentRootLoader(screen.fixture);
  const text = () => screen.element.textContent?.replace(/\s+/g, ' ') ?? '';
  const answer = async (path: string, body: object) => {
    screen.http.expectOne(screen.shop(path)).flush(body);
    await screen.fixture.whenStable();
  };
  return { ...screen, loader, root, text, answer };
}

const plain = (text: string | null) => text?.replace(/\s+/g, ' ').trim() ?? '';
/** The words of a cell, apart as they stand on the screen. */
const wordsOf = (cell: Element) =>
  cell.classList.contains('who')
    ? [...cell.children].map(({ textContent }) => plain(textContent)).join(' ')
    : plain(cell.textContent);

describe('everybody’s week', () => {
  it('has a row a member, a column a day, and adds up', async () => {
    const { answer, element } = await open(`/time${OF}`);
    const other = buildShopWeekRow({
      memberId: FRAMES.operation,
      memberName: 'Piet Moss',
      costCents: 20_000,
      hasOpenEntry: true,
    });
    await answer(`/time/weeks${OF}`, buildShopWeek([buildShopWeekRow({ costCents: 65_600 }), other]));
    const rows = [...element.querySelectorAll('tr')].map((row) =>
      [...row.children].map((cell) => wordsOf(cell.querySelector('.who') ?? cell)),
    );
    expect(rows[1]).toEqual([
      'Ines Okafor Crew',
      '8.0 h',
      '8.0 h',
      '–',
      '–',
      '–',
      '–',
      '–',
      '16.0 h',
      '$656.00',
    ]);
    expect(rows[2]?.[0]).toBe('Piet Moss Crew Open entry');
    expect(rows[3]).toEqual([
      ...['Together', '16.0 h', '16.0 h', '0.0 h', '0.0 h', '0.0 h', '0.0 h', '0.0 h', '32.0 h', '$856.00'],
    ]);
  });

  it('shows the lead hand no cost and no export', async () => {
    const { answer, element, text } = await open(`/time${OF}`, 'lead-hand');
    await answer(`/time/weeks${OF}`, buildShopWeek());
    expect(text()).not.toContain('$');
    expect(element.querySelector('a[download]')).toBeNull();
  });

  it('is exported as the week that is shown', async () => {
    const { answer, element, shop } = await open(`/time${OF}`, 'bookkeeper');
    await answer(`/time/weeks${OF}`, buildShopWeek());
    expect(element.querySelector('a[download]')?.getAttribute('href')).toBe(
      shop('/time/weeks/export?of=2027-01-11'),
    );
  });

  it('leads to the week before, and the address keeps it', async () => {
    const { answer, element, fixture } = await open(`/time${OF}`);
    await answer(`/time/weeks${OF}`, buildShopWeek());
    element.querySelector<HTMLElement>('[aria-label="The week before"]')!.click();
    await fixture.whenStable();
    await answer('/time/weeks?of=2027-01-04', buildShopWeek());
    expect(TestBed.inject(Router).url).toBe('/time?of=2027-01-04');
  });
});

describe('one’s own week', () => {
  it('is what the crew finds at the same address: days with entries, and nothing to correct', async () => {
    const { answer, text, element } = await open(`/time${OF}`, 'crew');
    const corrected = buildTimeEntryRow({
      ...entry,
      id: FRAMES.operation,
      corrected: true,
      startedAt: '2027-01-13T14:00:00.000Z',
      endedAt: '2027-01-13T14:30:00.000Z',
    });
    await answer(`/time/week${OF}`, buildMemberWeek([entry, corrected]));
    expect(text()).toContain('2 h 44 m of work');
    expect(text()).toContain('9:31 am – 11:45 am');
    expect(element.querySelector('[aria-label^="Menu of"]')).toBeNull();
    expect(element.querySelector('[aria-label^="Add time"]')).toBeNull();
    expect(element.querySelectorAll('[aria-label="History of Face frames"]')).toHaveLength(1);
  });

  it('shows the crew why an entry was corrected', async () => {
    const { answer, element, root, fixture } = await open(`/time${OF}`, 'crew');
    await answer(`/time/week${OF}`, buildMemberWeek([{ ...entry, corrected: true }]));
    element.querySelector<HTMLElement>('[aria-label="History of Face frames"]')!.click();
    await fixture.whenStable();
    const { jobId, operationId, kind, startedAt, endedAt, note } = entry;
    const before = { jobId, operationId, kind, startedAt, endedAt, note };
    const after = { ...before, endedAt: '2027-01-12T16:15:00.000Z' };
    const correction = {
      at: '2027-01-12T18:00:00.000Z',
      by: 'Ada Fenwick',
      reason: 'Left early',
      before,
      after,
    };
    await answer(`/time/entries/${entry.id}`, { ...entry, corrections: [correction] });
    const dialog = await root.getHarness(MatDialogHarness);
    expect(await dialog.getText()).toContain('Ada Fenwick');
    expect(await dialog.getText()).toContain('Left early');
    await (await dialog.getHarness(MatButtonHarness.with({ text: 'Close' }))).click();
  });
});

describe('a member’s week', () => {
  const show = async () => {
    const screen = await open(`/time/members/${MEMBER_ID}${OF}`, 'lead-hand');
    await screen.answer(`/time/weeks/${MEMBER_ID}${OF}`, buildMemberWeek([entry]));
    return screen;
  };

  it('corrects an entry with a reason, and reads the sums again', async () => {
    const { loader, root, answer, http, shop, fixture } = await show();
    const menu = await loader.getHarness(MatMenuHarness);
    await menu.open();
    await menu.clickItem({ text: /Correct/ });
    await answer(`/time/entries/${entry.id}`, buildTimeEntry({ ...entry, corrections: [] }));
    await answer('/time/clock/jobs', buildJobs());
    const dialog = await root.getHarness(MatDialogHarness);
    const save = await dialog.getHarness(MatButtonHarness.with({ text: 'Save time' }));
    await save.click();
    expect(await dialog.getText()).toContain('Say why, in a few words.');
    http.expectNone({ method: 'PATCH' });

    const field = (name: string) =>
      dialog.getHarness(MatInputHarness.with({ selector: `[formControlName=${name}]` }));
    await (await field('to')).setValue('11:15');
    await (await field('reason')).setValue('Left early');
    await save.click();
    const request = http.expectOne({ method: 'PATCH', url: shop(`/time/entries/${entry.id}`) });
    expect(request.request.body).toEqual({ reason: 'Left early', endedAt: '2027-01-12T16:15:00.000Z' });
    expect(request.request.headers.get('If-Match')).toBe('"1"');
    request.flush(buildTimeEntry({ ...entry, version: 2, endedAt: '2027-01-12T16:15:00.000Z' }));
    await fixture.whenStable();
    http.expectOne(shop(`/time/weeks/${MEMBER_ID}${OF}`));
    expect(await root.getAllHarnesses(MatDialogHarness)).toHaveLength(0);
  });

  it('says at each field what is missing before anything is sent', async () => {
    const { loader, root, answer, http, shop, fixture } = await show();
    await (await loader.getHarness(MatButtonHarness.with({ text: /Add time/ }))).click();
    await answer('/time/clock/jobs', buildJobs());
    const dialog = await root.getHarness(MatDialogHarness);
    const set = async (name: string, value: string) =>
      (await dialog.getHarness(MatInputHarness.with({ selector: `[formControlName=${name}]` }))).setValue(
        value,
      );
    await set('on', '2027-01-12');
    await set('from', '09:00');
    await set('to', '10:00');
    await set('reason', 'Forgot');
    await (await dialog.getHarness(MatButtonHarness.with({ text: 'Save time' }))).click();
    expect(await dialog.getText()).toContain('Choose an operation.');
    http.expectNone(shop('/time/entries'));
    await (await dialog.getHarness(MatButtonHarness.with({ text: 'Cancel' }))).click();
    await fixture.whenStable();
  });

  it('voids an entry only with a reason', async () => {
    const { loader, root, http, shop, fixture } = await show();
    const menu = await loader.getHarness(MatMenuHarness);
    await menu.open();
    await menu.clickItem({ text: /Void/ });
    const dialog = await root.getHarness(MatDialogHarness);
    const press = async () => (await dialog.getHarness(MatButtonHarness.with({ text: 'Void' }))).click();
    await press();
    http.expectNone(shop(`/time/entries/${entry.id}/void`));
    await (await dialog.getHarness(MatInputHarness)).setValue('Clocked twice');
    await press();
    const request = http.expectOne(shop(`/time/entries/${entry.id}/void`));
    expect(request.request.body).toEqual({ reason: 'Clocked twice' });
    request.flush(buildTimeEntry({ ...entry, version: 2, voidedAt: '2027-01-13T12:00:00.000Z' }));
    await fixture.whenStable();
    http.expectOne(shop(`/time/weeks/${MEMBER_ID}${OF}`));
  });
});

describe('all entries', () => {
  it('are asked for as the address says, with the way to the member’s week', async () => {
    const { http, shop, loader, element } = await open(`/time/entries?jobId=${FRAMES.job}`);
    const rows = [{ ...entry, costCents: 9_100 }];
    http.expectOne(shop(`/time/entries?jobId=${FRAMES.job}`)).flush({ rows, next: null, total: 1 });
    const table = await loader.getHarness(DataTableHarness);
    const [cells] = await table.cellTexts();
    expect(cells?.slice(1, 5)).toEqual([
      'Ines Okafor',
      'Face frames Job 1042, Mudroom lockers and bench',
      '2 h 14 m',
      '$91.00',
    ]);
    expect(element.querySelector('td a')?.getAttribute('href')).toBe(
      `/time/members/${MEMBER_ID}?of=2027-01-12`,
    );
  });
});
