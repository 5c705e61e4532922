import { inject, Injectable, signal } from '@angular/core';
import { Observable, share } from 'rxjs';
import { CurrentShop } from '../../platform/session/current-shop';
import type { KeptPunch } from './punch';
import { memoryPunchBox, openPunchBox, type PunchBox } from './punch-box';

const NAME = 'bookmatch-punches';

/** The punches of the signed-in member that wait on this device. */
@Injectable({ providedIn: 'root' })
export class PunchStore {
  private readonly membership = inject(CurrentShop).membership;
  private readonly box: Promise<PunchBox> = openPunchBox().catch(() => this.withoutDisk());
  private readonly channel = typeof BroadcastChannel === 'undefined' ? null : new BroadcastChannel(NAME);

  /** False when this browser keeps nothing: closing the page would lose what waits. */
  readonly outlivesPage = signal(true);
  /** Another tab changed what waits. */
  readonly changedElsewhere$ = new Observable<void>((observer) => {
    const tell = (): void => observer.next();
    this.channel?.addEventListener('message', tell);
    return () => this.channel?.removeEventListener('message', tell);
  }).pipe(share());

  async read(): Promise<KeptPunch[]> {
    const owner = this.owner();
    return owner === null ? [] : (await this.box).read(owner);
  }

  async change(to: (punches: readonly KeptPunch[]) => KeptPunch[]): Promise<KeptPunch[]> {
    const owner = this.owner();
    if (owner === null) return [];
    const punches = await (await this.box).change(owner, to);
    this.channel?.postMessage('changed');
    return punches;
  }

  /** Lets one tab at a time send, so that the order holds among all of them. */
  async alone<Result>(work: () => Promise<Result>): Promise<Result> {
    const locks = typeof navigator === 'undefined' ? undefined : (navigator.locks as LockManager | undefined);
    return locks ? ((await locks.request(NAME, work)) as Result) : work();
  }

  private owner(): string | null {
    const here = this.membership();
    return here && `${here.shopId}/${here.memberId}`;
  }

  private withoutDisk(): PunchBox {
    this.outlivesPage.set(false);
    return memoryPunchBox();
  }
}
