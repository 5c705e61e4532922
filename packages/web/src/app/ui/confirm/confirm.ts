import { inject, Injectable } from '@angular/core';
import { MatDialog } from '@angular/material/dialog';
import type { Observable } from 'rxjs';
import { ConfirmDialog } from './confirm-dialog';
import type { ConfirmAnswer, ConfirmQuestion } from './confirm-question';

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
