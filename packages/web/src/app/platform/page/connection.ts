import { DOCUMENT, inject, Injectable } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { EMPTY, fromEvent, map, merge } from 'rxjs';

/** Whether the browser believes it has a network. */
@Injectable({ providedIn: 'root' })
export class Connection {
  private readonly window = inject(DOCUMENT).defaultView;

  readonly online = toSignal(
    this.window
      ? merge(fromEvent(this.window, 'online'), fromEvent(this.window, 'offline')).pipe(
          map(() => this.window?.navigator.onLine ?? true),
        )
      : EMPTY,
    { initialValue: this.window?.navigator.onLine ?? true },
  );
}
