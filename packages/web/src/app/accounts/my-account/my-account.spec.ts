import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { MatButtonHarness } from '@angular/material/button/testing';
import { MatFormFieldHarness } from '@angular/material/form-field/testing';
import { MatInputHarness } from '@angular/material/input/testing';
import { MatSnackBarHarness } from '@angular/material/snack-bar/testing';
import { sessionFeature } from '../../platform/session/session.state';
import { openShopScreen } from '../../testing/shop-screen';
import ownAccountRoutes from '../own-account.routes';
import { deviceName } from './device-name';

const FIREFOX = 'Mozilla/5.0 (Windows NT 10.0; Win64; x64; rv:132.0) Gecko/20100101 Firefox/132.0';
const PHONE =
  'Mozilla/5.0 (iPhone; CPU iPhone OS 18_0 like Mac OS X) Version/18.0 Mobile/15E148 Safari/604.1';
const seen = { createdAt: '2026-01-01T12:00:00Z', address: '203.0.113.9' };
const rows = [
  { id: 'phone', current: false, userAgent: PHONE, lastSeenAt: '2026-01-03T12:00:00Z', ...seen },
  { id: 'desk', current: true, userAgent: FIREFOX, lastSeenAt: '2026-01-02T12:00:00Z', ...seen },
];

async function open() {
  const screen = await openShopScreen([{ path: 'account', children: ownAccountRoutes }], '/account');
  screen.http.expectOne('/api/account/sessions').flush({ rows });
  await screen.fixture.whenStable();
  const loader = TestbedHarnessEnvironment.documentRootLoader(screen.fixture);
  const type = async (label: string, text: string) => {
    const field = await loader.getHarness(MatFormFieldHarness.with({ floatingLabelText: label }));
    await (await field.getControl(MatInputHarness))?.setValue(text);
  };
  const press = async (text: string) => (await loader.getHarness(MatButtonHarness.with({ text }))).click();
  return { ...screen, loader, type, press };
}

describe('MyAccount', () => {
  it('lists where the person is signed in, this place first and without a way to end it', async () => {
    const { element } = await open();
    const places = [...element.querySelectorAll('bm-own-sessions li')];
    expect(places.map((place) => place.querySelector('strong')?.textContent)).toEqual([
      'Firefox on Windows',
      'Safari on iPhone',
    ]);
    expect(places.map((place) => place.querySelectorAll('button').length)).toEqual([0, 1]);
  });

  it('signs out at another place', async () => {
    const { press, http, element, fixture } = await open();
    await press('Sign out');
    http
      .expectOne({ url: '/api/account/sessions/phone', method: 'DELETE' })
      .flush(null, { status: 204, statusText: '' });
    await fixture.whenStable();
    expect(element.querySelectorAll('bm-own-sessions li')).toHaveLength(1);
  });

  it('changes the name, in the session too', async () => {
    const { type, press, http, store, loader } = await open();
    await type('Name', ' Ada Wren ');
    await press('Save name');
    const person = { id: seen.address, name: 'Ada Wren', email: 'ada@example.test', emailConfirmed: true };
    http
      .expectOne({ url: '/api/account/person', method: 'PATCH' })
      .flush({ ...person, id: '01940000-0000-7000-8000-000000000001' });
    expect(store.selectSignal(sessionFeature.selectPerson)()?.name).toBe('Ada Wren');
    expect(await (await loader.getHarness(MatSnackBarHarness)).getMessage()).toBe('Name saved.');
  });

  it('changes the password and empties the fields without a complaint', async () => {
    const { type, press, http, fixture, element } = await open();
    await type('Current password', 'the old password');
    await type('New password', 'a new long password');
    await press('Change password');
    http.expectOne('/api/account/change-password').flush(null, { status: 204, statusText: '' });
    await fixture.whenStable();
    const fields = [...element.querySelectorAll<HTMLInputElement>('input[type=password]')];
    expect(fields.map(({ value }) => value)).toEqual(['', '']);
    expect(element.querySelector('bm-password-form mat-error')).toBeNull();
  });
});

describe('deviceName', () => {
  it('says which browser on what', () => {
    expect(deviceName(FIREFOX)).toBe('Firefox on Windows');
    expect(deviceName('curl/8')).toBe('Unknown browser');
  });
});
