import { Injectable } from '@angular/core';
import type { KeptPunch, PunchedWork } from './punch';
import type { Running } from './apply-punches';
import { uuidV7 } from './uuid-v7';

/** Makes punches: the only place here that knows the time and makes ids. */
@Injectable({ providedIn: 'root' })
export class PunchMaker {
  private lastOrder = 0;

  clockIn(work: PunchedWork, running: Running | null, source: 'phone' | 'desk'): KeptPunch {
    const now = new Date();
    return {
      ...{ type: 'in', order: this.nextOrder(now), at: now.toISOString(), entryId: uuidV7(now.getTime()) },
      ...{ work, source, before: running?.entryId ?? null, refused: null },
    };
  }

  /** @param at when the work really stopped; now when left out */
  clockOut({ entryId, work }: Running, at?: string): KeptPunch {
    const now = new Date();
    const order = this.nextOrder(now);
    return { type: 'out', order, at: at ?? now.toISOString(), entryId, work, refused: null };
  }

  /** By the time of day, so that it grows across reloads and tabs; never the same twice. */
  private nextOrder(now: Date): number {
    this.lastOrder = Math.max(this.lastOrder + 1, now.getTime());
    return this.lastOrder;
  }
}
