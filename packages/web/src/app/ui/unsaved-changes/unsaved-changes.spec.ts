import { TestBed } from '@angular/core/testing';
import type { ActivatedRouteSnapshot, RouterStateSnapshot } from '@angular/router';
import { firstValueFrom, of, type Observable } from 'rxjs';
import { Confirm } from '../confirm/confirm';
import { unsavedChanges } from './unsaved-changes';

function leave(unsaved: boolean, answer: { reason: string } | undefined) {
  const ask = jest.fn(() => of(answer));
  TestBed.configureTestingModule({ providers: [{ provide: Confirm, useValue: { ask } }] });
  const here = {} as ActivatedRouteSnapshot;
  const state = {} as RouterStateSnapshot;
  const result = TestBed.runInInjectionContext(() =>
    unsavedChanges({ hasUnsavedChanges: () => unsaved }, here, state, state),
  );
  return { ask, result: firstValueFrom(result as Observable<boolean>) };
}

describe('unsavedChanges', () => {
  it('lets go without asking when nothing is typed', async () => {
    const { ask, result } = leave(false, undefined);
    await expect(result).resolves.toBe(true);
    expect(ask).not.toHaveBeenCalled();
  });

  it('asks, and goes or stays by the answer', async () => {
    await expect(leave(true, { reason: '' }).result).resolves.toBe(true);
    TestBed.resetTestingModule();
    await expect(leave(true, undefined).result).resolves.toBe(false);
  });
});
