import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { MatButtonHarness } from '@angular/material/button/testing';
import { MatFormFieldHarness } from '@angular/material/form-field/testing';
import { MatInputHarness } from '@angular/material/input/testing';
import { buildSession } from '../../testing/session';
import { openShopScreen } from '../../testing/shop-screen';
import { PageLoad } from '../../platform/session/page-load';
import accountsRoutes from '../accounts.routes';

async function open(url: string) {
  const gone: string[] = [];
  const page = { provide: PageLoad, useValue: { go: (path: string) => gone.push(path) } };
  const screen = await openShopScreen(accountsRoutes, url, undefined, [page]);
  const loader = TestbedHarnessEnvironment.loader(screen.fixture);
  const type = async (label: string, text: string) => {
    const field = await loader.getHarness(MatFormFieldHarness.with({ floatingLabelText: label }));
    await (await field.getControl(MatInputHarness))?.setValue(text);
  };
  const press = async (text: string) => (await loader.getHarness(MatButtonHarness.with({ text }))).click();
  return { ...screen, gone, type, press };
}

async function signIn(url: string) {
  const screen = await open(url);
  await screen.type('E-mail', 'Ada@Example.test');
  await screen.type('Password', 'a long enough password');
  await screen.press('Sign in');
  return screen;
}

describe('SignIn', () => {
  it('goes on to where the person wanted to go', async () => {
    const { http, gone } = await signIn('/sign-in?return=%2Fs%2Fnorthgrain%2Fjobs%3Fq%3Da');
    const asked = http.expectOne('/api/account/sign-in');
    expect(asked.request.body).toEqual({ email: 'ada@example.test', password: 'a long enough password' });
    expect(gone).toEqual([]);
    asked.flush(buildSession());
    expect(gone).toEqual(['/s/northgrain/jobs?q=a']);
  });

  it('never goes to another site', async () => {
    const { http, gone } = await signIn('/sign-in?return=%2F%2Felsewhere.test');
    http.expectOne('/api/account/sign-in').flush(buildSession());
    expect(gone).toEqual(['/']);
  });

  it('shows why it was refused, and keeps what was typed', async () => {
    const { http, element, fixture } = await signIn('/sign-in');
    const detail = 'The e-mail address or the password is wrong.';
    const problem = { type: '', title: '', status: 401, code: 'wrong-credentials', detail };
    http.expectOne('/api/account/sign-in').flush(problem, { status: 401, statusText: '' });
    await fixture.whenStable();
    expect(element.querySelector('[role=alert]')?.textContent).toContain(detail);
    expect(element.querySelector<HTMLInputElement>('input[type=email]')?.value).toBe('Ada@Example.test');
  });

  it('tells somebody who chose a new password to sign in with it', async () => {
    const { element } = await open('/sign-in?reset');
    expect(element.textContent).toContain('Your new password is set.');
  });
});
