import { ChangeDetectionStrategy, Component } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { provideRouter, Router } from '@angular/router';
import { RouterTestingHarness } from '@angular/router/testing';
import { injectListAddress } from './list-address';

@Component({ selector: 'bm-list-test', template: '', changeDetection: ChangeDetectionStrategy.OnPush })
class ListScreen {
  readonly address = injectListAddress('kind');
}

async function open(url: string) {
  TestBed.configureTestingModule({
    providers: [provideRouter([{ path: 'customers', component: ListScreen }])],
  });
  const harness = await RouterTestingHarness.create();
  const { address } = await harness.navigateByUrl(url, ListScreen);
  const router = TestBed.inject(Router);
  const settled = async () => {
    await harness.fixture.whenStable();
    return router.url;
  };
  return { address, settled };
}

describe('a list in the address', () => {
  it('reads what it knows and ignores the rest', async () => {
    const { address } = await open('/customers?q=wren&kind=designer&utm=x&sort=');
    expect(address.query()).toEqual({ q: 'wren', kind: 'designer' });
    expect(address.narrowed()).toBe(true);
  });

  it('starts again on the first page when what is listed changes', async () => {
    const { address, settled } = await open('/customers?after=c2&sort=name');
    address.search('  wren ');
    expect(await settled()).toBe('/customers?sort=name&q=wren');
    address.filterBy('kind', 'designer');
    expect(await settled()).toBe('/customers?sort=name&q=wren&kind=designer');
    address.clear();
    expect(await settled()).toBe('/customers?sort=name');
    expect(address.narrowed()).toBe(false);
  });

  it('pages on and back the way it came', async () => {
    const { address, settled } = await open('/customers');
    address.next('c1');
    expect(await settled()).toBe('/customers?after=c1');
    address.next('c2');
    await settled();
    address.previous();
    expect(await settled()).toBe('/customers?after=c1');
    address.previous();
    expect(await settled()).toBe('/customers');
    expect(address.hasPrevious()).toBe(false);
  });

  it('goes back to the first page after a reload', async () => {
    const { address, settled } = await open('/customers?after=c2');
    expect(address.hasPrevious()).toBe(true);
    address.previous();
    expect(await settled()).toBe('/customers');
  });
});
