import { TestBed } from '@angular/core/testing';
import { buildMembership } from '../../testing/session';
import { LastShop } from './last-shop';

const first = buildMembership({ slug: 'first' });
const second = buildMembership({ slug: 'second' });

describe('LastShop', () => {
  beforeEach(() => localStorage.clear());
  const lastShop = () => TestBed.inject(LastShop);

  it('picks the only shop', () => {
    expect(lastShop().pick([first])).toBe(first);
  });

  it('asks when there are several and none was open here', () => {
    expect(lastShop().pick([first, second])).toBeNull();
  });

  it('picks the one that was open last, while the person still belongs to it', () => {
    lastShop().remember('second');
    expect(lastShop().pick([first, second])).toBe(second);
    lastShop().remember('gone');
    expect(lastShop().pick([first, second])).toBeNull();
  });
});
