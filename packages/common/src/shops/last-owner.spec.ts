import { refuseLosingLastOwner } from './last-owner.js';

describe('the last owner', () => {
  it('can neither leave nor take another role', () => {
    expect(refuseLosingLastOwner(['a'], 'a', null)?.code).toBe('conflict');
    expect(refuseLosingLastOwner(['a'], 'a', 'crew')?.code).toBe('conflict');
  });

  it('may be made an owner again', () => {
    expect(refuseLosingLastOwner(['a'], 'a', 'owner')).toBeNull();
  });

  it('is nobody while there are two, and never somebody who is not an owner', () => {
    expect(refuseLosingLastOwner(['a', 'b'], 'a', null)).toBeNull();
    expect(refuseLosingLastOwner(['a'], 'c', null)).toBeNull();
  });
});
