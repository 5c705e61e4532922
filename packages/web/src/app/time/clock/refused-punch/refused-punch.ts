import { ChangeDetectionStrategy, Component, computed, inject, input, signal } from '@angular/core';
import { MatDialog } from '@angular/material/dialog';
import { MatIcon } from '@angular/material/icon';
import { dateIn } from '@bookmatch/common/calendar/shop-dates';
import { Store } from '@ngrx/store';
import { Confirm } from '../../../ui/confirm/confirm';
import { DateTextPipe } from '../../../ui/formats/date-text.pipe';
import type { KeptPunch, PunchedWork } from '../../punches/punch';
import { jobOf, whatOf } from '../../punches/work-words';
import { ClockPage } from '../../state/clock.actions';
import { ClockFace } from '../clock-face';
import { OtherWork, type OtherWorkQuestion } from '../other-work/other-work';
import { StoppedEarlier } from '../stopped-earlier/stopped-earlier';
import { injectNow } from '../ticking';

/** A punch that the server did not take, with its reason and the ways to settle it. It is never dropped by itself. */
@Component({
  selector: 'bm-refused-punch',
  imports: [DateTextPipe, MatIcon, StoppedEarlier],
  templateUrl: './refused-punch.html',
  styleUrl: './refused-punch.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { role: 'alert' },
})
export class RefusedPunch {
  readonly punch = input.required<KeptPunch>();
  readonly waitingBehind = input(0);

  private readonly store = inject(Store);
  private readonly dialog = inject(MatDialog);
  private readonly confirm = inject(Confirm);
  protected readonly face = inject(ClockFace);
  protected readonly now = injectNow();
  protected readonly whatOf = whatOf;
  protected readonly jobOf = jobOf;
  protected readonly givesTime = signal(false);
  /** The day is named when it is not today. */
  protected readonly today = computed(
    () => dateIn(this.face.zone(), this.punch().at) === dateIn(this.face.zone(), this.now()),
  );
  /** What the punch was to end, when it is what runs now. */
  protected readonly ended = computed(() => {
    const running = this.face.running();
    return running?.entryId === this.punch().entryId ? running : null;
  });

  protected putOn(): void {
    const data: OtherWorkQuestion = { jobId: null };
    this.dialog
      .open<OtherWork, OtherWorkQuestion, PunchedWork>(OtherWork, {
        data,
        width: '520px',
        autoFocus: 'dialog',
      })
      .afterClosed()
      .subscribe((work) => {
        if (work) this.store.dispatch(ClockPage.refusedPutOn({ order: this.punch().order, work }));
      });
  }

  protected moveTo(at: string): void {
    this.store.dispatch(ClockPage.refusedMoved({ order: this.punch().order, at }));
  }

  protected letGo(): void {
    const question = {
      title: 'Let this punch go?',
      text: 'It will not be sent. Tell the lead hand, who can enter the time.',
      action: 'Let it go',
      tone: 'harm',
    } as const;
    this.confirm.ask(question).subscribe((answer) => {
      if (answer) this.store.dispatch(ClockPage.refusedLetGo({ order: this.punch().order }));
    });
  }
}
