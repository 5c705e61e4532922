import { DestroyRef, DOCUMENT, inject } from '@angular/core';
import type { CanDeactivateFn } from '@angular/router';
import { map, of } from 'rxjs';
import { Confirm } from '../confirm/confirm';

/** A screen with something typed that is not kept yet. */
export type HasUnsavedChanges = { hasUnsavedChanges(): boolean };

/** On the route of a form: asks before what was typed is left behind. */
export const unsavedChanges: CanDeactivateFn<HasUnsavedChanges> = (screen) => {
  if (!screen.hasUnsavedChanges()) return of(true);
  return inject(Confirm)
    .ask({
      title: 'Leave without saving?',
      text: 'What you typed here has not been saved.',
      action: 'Leave',
      cancel: 'Stay',
      tone: 'harm',
    })
    .pipe(map((answer) => answer !== undefined));
};

/** In a field of the same screen: asks also when the window is closed or reloaded. */
export function warnBeforeUnload(hasUnsavedChanges: () => boolean): void {
  const window = inject(DOCUMENT).defaultView;
  const warn = (event: BeforeUnloadEvent): void => {
    if (hasUnsavedChanges()) event.preventDefault();
  };
  window?.addEventListener('beforeunload', warn);
  inject(DestroyRef).onDestroy(() => window?.removeEventListener('beforeunload', warn));
}
