import { TestBed } from '@angular/core/testing';
import { idSchema } from '@bookmatch/common/wire/fields';
import { buildRunning, buildWork, FRAMES } from '../testing/build-punch';
import { PunchMaker } from './punch-maker';
import { uuidV7 } from './uuid-v7';

describe('a new punch', () => {
  const maker = () => TestBed.inject(PunchMaker);

  it('begins an entry now, with an id of its own, and knows what was open before', () => {
    const before = Date.now();
    const punch = maker().clockIn(buildWork(), buildRunning(), 'phone');
    expect(Date.parse(punch.at)).toBeGreaterThanOrEqual(before);
    expect(idSchema.safeParse(punch.entryId).success).toBe(true);
    expect(punch).toMatchObject({ type: 'in', source: 'phone', before: FRAMES.entry, refused: null });
  });

  it('ends what runs, now or when it is said to have ended', () => {
    const at = '2027-01-12T17:00:00.000Z';
    expect(maker().clockOut(buildRunning(), at)).toMatchObject({ type: 'out', entryId: FRAMES.entry, at });
    expect(Date.parse(maker().clockOut(buildRunning()).at)).toBeGreaterThan(Date.parse('2026-01-01'));
  });

  it('comes after every punch before it, also within a millisecond', () => {
    const orders = Array.from({ length: 50 }, () => maker().clockIn(buildWork(), null, 'desk').order);
    expect(new Set(orders).size).toBe(50);
    expect(orders).toEqual(orders.toSorted((a, b) => a - b));
  });
});

describe('an id of version 7', () => {
  // RFC 9562, appendix A.6: Tuesday, February 22, 2022 2:22:22.00 PM GMT-05:00.
  it('begins with the milliseconds', () => {
    expect(uuidV7(0x017f22e279b0)).toMatch(/^017f22e2-79b0-7[0-9a-f]{3}-[89ab][0-9a-f]{3}-[0-9a-f]{12}$/);
  });

  it('is another one each time', () => {
    expect(new Set(Array.from({ length: 100 }, () => uuidV7(1))).size).toBe(100);
  });
});
