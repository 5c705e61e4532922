import { inject, Injectable } from '@angular/core';
import { MatDialog } from '@angular/material/dialog';
import type { Observable } from 'rxjs';
import { ConfirmDialog } from './confirm-dialog';

export type ConfirmQuestion = {
  title: string;
  text: string;
  /** The button that goes on, named after what it does: "Archive". */
  action: string;
  /** `harm` for what cannot be taken back. */
  tone?: 'plain' | 'harm';
  cancel?: string;
  /** Asks why, in the person's own words. */
  reason?: { label: string; required: boolean };
};
export type ConfirmAnswer = { reason: string };

/** Asks before something is done that deserves a second thought. Emits the answer, or undefined for no, then ends. */
@Injectable({ providedIn: 'root' })
export class Confirm {
  private readonly dialog = inject(MatDialog);

  ask(question: ConfirmQuestion): Observable<ConfirmAnswer | undefined> {
    return this.dialog
      .open<ConfirmDialog, ConfirmQuestion, ConfirmAnswer>(ConfirmDialog, { data: question, width: '440px' })
      .afterClosed();
  }
}
