import { inject, Injectable } from '@angular/core';
import { MatSnackBar } from '@angular/material/snack-bar';
import type { Problem } from '@bookmatch/common/problems/problem';

/** Short messages at the foot of the page, read out politely: that something was done, or why it was not. */
@Injectable({ providedIn: 'root' })
export class Notices {
  private readonly snackBar = inject(MatSnackBar);

  say(message: string): void {
    this.snackBar.open(message, undefined, { duration: 4000, politeness: 'polite' });
  }

  /** A refusal stays until it is dismissed; a fault names its reference number. */
  problem({ detail, reference, status }: Problem): void {
    const text = status >= 500 && reference ? `${detail} Reference ${reference}.` : detail;
    this.snackBar.open(text, 'Close', { politeness: 'assertive' });
  }

  /** With an action, such as taking back what was just done. */
  offer(message: string, action: string, onAction: () => void): void {
    this.snackBar.open(message, action, { duration: 8000 }).onAction().subscribe(onAction);
  }
}
