import { inject, Injectable } from '@angular/core';
import { MatDialog } from '@angular/material/dialog';
import type { TimeEntryRow } from '@bookmatch/common/time/time-contract';
import { Store } from '@ngrx/store';
import { Confirm } from '../../ui/confirm/confirm';
import { whatOf } from '../punches/work-words';
import { WeeksPage } from '../state/weeks.actions';
import { EntryForm, type EntryFormSubject } from './entry-form/entry-form';

/** The dialogs in which time is put right, the same from every screen that shows entries. */
@Injectable({ providedIn: 'root' })
export class EntryDialogs {
  private readonly dialog = inject(MatDialog);
  private readonly confirm = inject(Confirm);
  private readonly store = inject(Store);

  add(memberId: string, memberName: string, on: string): void {
    this.open({ memberId, memberName, entry: null, on });
  }

  /** Shows the entry with its history; whoever may, corrects it there. */
  show(entry: TimeEntryRow): void {
    const { memberId, memberName } = entry;
    this.open({ memberId, memberName, entry, on: null });
  }

  void(entry: TimeEntryRow): void {
    const question = {
      title: `Void ${whatOf(entry)}?`,
      text: 'It leaves every sum and stays to be read, with your reason.',
      action: 'Void',
      tone: 'harm',
      reason: { label: 'Why', required: true },
    } as const;
    this.confirm.ask(question).subscribe((answer) => {
      if (answer)
        this.store.dispatch(WeeksPage.voidConfirmed({ entry, reason: answer.reason.slice(0, 300) }));
    });
  }

  private open(data: EntryFormSubject): void {
    this.dialog.open(EntryForm, { data, width: '560px', disableClose: true });
  }
}
