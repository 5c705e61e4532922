import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatIcon } from '@angular/material/icon';
import { Store } from '@ngrx/store';
import { Connection } from '../../../platform/page/connection';
import { PunchStore } from '../../punches/punch-store';
import { ClockPage } from '../../state/clock.actions';
import { ClockFace } from '../clock-face';
import { keptSentence } from './kept-sentence';

/** How many punches wait on this device and why, read out when it changes. */
@Component({
  selector: 'bm-kept-note',
  imports: [MatButton, MatIcon],
  template: `
    <div role="status">
      @if (sentence(); as text) {
        <p>
          <mat-icon [svgIcon]="face.waiting() === 'no-network' || !online() ? 'offline' : 'sync'" />{{ text }}
        </p>
      }
    </div>
    @if (sentence() && face.waiting() === 'signed-out') {
      <button matButton="filled" type="button" (click)="send()">Sign in and send</button>
    }
  `,
  styleUrl: './kept-note.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class KeptNote {
  protected readonly face = inject(ClockFace);
  private readonly store = inject(Store);
  private readonly punches = inject(PunchStore);
  protected readonly online = inject(Connection).online;

  protected readonly sentence = computed(() =>
    keptSentence({
      count: this.face.punches().filter((punch) => punch.refused === null).length,
      waiting: this.face.waiting() ?? (this.online() ? null : 'no-network'),
      behindRefused: this.face.refused() !== null,
      outlivesPage: this.punches.outlivesPage(),
    }),
  );

  protected send(): void {
    this.store.dispatch(ClockPage.sendPressed());
  }
}
