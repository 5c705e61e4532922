import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { MatButtonHarness } from '@angular/material/button/testing';
import { MatFormFieldHarness } from '@angular/material/form-field/testing';
import { MatInputHarness } from '@angular/material/input/testing';
import { openShopScreen } from '../../testing/shop-screen';
import accountsRoutes from '../accounts.routes';
import { likelyZone } from './time-zones';

async function open() {
  const screen = await openShopScreen(accountsRoutes, '/sign-up');
  const loader = TestbedHarnessEnvironment.loader(screen.fixture);
  const field = (label: string) => loader.getHarness(MatFormFieldHarness.with({ floatingLabelText: label }));
  const type = async (label: string, text: string) =>
    (await (await field(label)).getControl(MatInputHarness))?.setValue(text);
  const press = async (text: string) => (await loader.getHarness(MatButtonHarness.with({ text }))).click();
  return { ...screen, field, type, press };
}

describe('SignUp', () => {
  it('says what is missing at each field', async () => {
    const { press, type, field, http } = await open();
    await type('Password', 'too short');
    await press('Open the shop');
    expect(await (await field('Shop name')).getTextErrors()).toEqual(["The shop's name cannot be empty."]);
    expect(await (await field('Password')).getTextErrors()).toEqual(['Use at least 12 characters.']);
    http.expectNone('/api/account/sign-up');
  });

  it('opens the shop and says where the letter went', async () => {
    const { press, type, http, fixture, element } = await open();
    await type('Shop name', 'Northgrain Cabinets');
    await type('Your name', 'Ada Fenwick');
    await type('E-mail', 'ada@example.test');
    await type('Password', 'a long enough password');
    await press('Open the shop');
    const asked = http.expectOne('/api/account/sign-up');
    expect(asked.request.body).toMatchObject({
      shopName: 'Northgrain Cabinets',
      unitSystem: 'inch',
      timeZone: likelyZone(),
    });
    asked.flush(null, { status: 202, statusText: '' });
    await fixture.whenStable();
    expect(element.textContent).toContain('A letter is on its way to ada@example.test');
    await press('Send it again');
    expect(http.expectOne('/api/account/resend-confirmation').request.body).toEqual({
      email: 'ada@example.test',
    });
  });
});

describe('likelyZone', () => {
  it("takes the browser's zone when it is a place, and Eastern otherwise", () => {
    expect(likelyZone('America/Denver')).toBe('America/Denver');
    expect(likelyZone('Europe/Berlin')).toBe('Europe/Berlin');
    expect(likelyZone('UTC')).toBe('America/New_York');
  });
});
