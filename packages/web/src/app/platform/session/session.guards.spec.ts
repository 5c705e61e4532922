import { TestBed } from '@angular/core/testing';
import { provideRouter, RedirectCommand, type Route, type UrlSegment } from '@angular/router';
import type { ActivatedRouteSnapshot, RouterStateSnapshot } from '@angular/router';
import { defineAbility } from '@bookmatch/common/access/ability';
import { provideStore, Store } from '@ngrx/store';
import { buildMembership, buildSession } from '../../testing/session';
import { ABILITY, asSubject, emptyAbility } from './ability';
import { PageLoad } from './page-load';
import { SessionApi, SessionPage } from './session.actions';
import { canMatchAbility, memberHere, signedIn } from './session.guards';
import { sessionFeature } from './session.state';

const here = {} as ActivatedRouteSnapshot;
const state = {} as RouterStateSnapshot;

function setUp(slug = 'northgrain') {
  const page = { go: jest.fn(), toSignIn: jest.fn() };
  TestBed.configureTestingModule({
    providers: [
      provideRouter([]),
      provideStore({ session: sessionFeature.reducer }),
      { provide: PageLoad, useValue: page },
      { provide: ABILITY, useFactory: emptyAbility },
    ],
  });
  const store = TestBed.inject(Store);
  store.dispatch(SessionPage.started({ slug }));
  return { page, store };
}

describe('guards', () => {
  it('sends somebody without a session to sign in, and lets the others through', () => {
    const { page, store } = setUp();
    store.dispatch(SessionApi.missing());
    expect(TestBed.runInInjectionContext(() => signedIn(here, state))).toBe(false);
    expect(page.toSignIn).toHaveBeenCalled();
    store.dispatch(SessionApi.loaded({ session: buildSession() }));
    expect(TestBed.runInInjectionContext(() => signedIn(here, state))).toBe(true);
  });

  it('sends somebody from a shop that is not theirs back to the front door', () => {
    const { page, store } = setUp('somebody-elses');
    store.dispatch(SessionApi.loaded({ session: buildSession() }));
    expect(TestBed.runInInjectionContext(() => memberHere(here, state))).toBe(false);
    expect(page.go).toHaveBeenCalledWith('/?unknown-shop');
  });

  it('opens a screen by ability, and tells the others at the same address', () => {
    setUp();
    const ability = TestBed.inject(ABILITY);
    const open = () =>
      TestBed.runInInjectionContext(() => canMatchAbility('read', 'Lead')({} as Route, [] as UrlSegment[]));
    const refused = open();
    expect(refused).toBeInstanceOf(RedirectCommand);
    expect(String((refused as RedirectCommand).redirectTo)).toBe('/no-access');
    ability.update(defineAbility(buildMembership()).rules);
    expect(open()).toBe(true);
  });

  it('keeps the conditions of a role when the rules are updated', () => {
    setUp();
    const ability = TestBed.inject(ABILITY);
    const crew = buildMembership({ role: 'crew' });
    ability.update(defineAbility(crew).rules);
    expect(ability.can('update', asSubject('TimeEntry', { memberId: crew.memberId }), 'floor')).toBe(true);
    expect(ability.can('update', asSubject('TimeEntry', { memberId: 'another' }), 'floor')).toBe(false);
  });
});
