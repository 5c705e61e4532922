import { inject, Injectable } from '@angular/core';
import { MatDialog } from '@angular/material/dialog';

/** Opens quick find, whose code is only loaded then. */
@Injectable({ providedIn: 'root' })
export class QuickFindOpener {
  private readonly dialog = inject(MatDialog);

  open(): void {
    if (this.dialog.openDialogs.length > 0) return;
    void import('./quick-find').then(({ QuickFind }) =>
      this.dialog.open(QuickFind, {
        width: '560px',
        maxWidth: '94vw',
        position: { top: '10vh' },
        autoFocus: 'input',
        ariaLabel: 'Find',
      }),
    );
  }
}
