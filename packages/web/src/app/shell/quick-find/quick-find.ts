import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { rxResource, toObservable, toSignal } from '@angular/core/rxjs-interop';
import { MatDialogRef } from '@angular/material/dialog';
import { MatIcon } from '@angular/material/icon';
import { Router } from '@angular/router';
import { quickFindSchema, type Found } from '@bookmatch/common/today/quick-find-contract';
import { debounceTime } from 'rxjs';
import { ApiClient } from '../../platform/api/api-client';
import { injectShopUrl } from '../../platform/session/current-shop';
import { PLACES } from './places';

const TYPING_PAUSE_MS = 200;

/** Finds anything of the shop by its name or number, from anywhere, by keyboard alone. */
@Component({
  selector: 'bm-quick-find',
  imports: [MatIcon],
  templateUrl: './quick-find.html',
  styleUrl: './quick-find.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { '(keydown)': 'walk($event)' },
})
export class QuickFind {
  private readonly api = inject(ApiClient);
  private readonly shopUrl = injectShopUrl();
  private readonly router = inject(Router);
  private readonly dialog = inject(MatDialogRef);
  protected readonly places = PLACES;
  protected readonly text = signal('');
  private readonly asked = toSignal(toObservable(this.text).pipe(debounceTime(TYPING_PAUSE_MS)), {
    initialValue: '',
  });

  protected readonly found = rxResource({
    params: () => this.asked().trim() || undefined,
    stream: ({ params: q }) => this.api.get(this.shopUrl('/find'), { answer: quickFindSchema, query: { q } }),
  });
  protected readonly rows = computed(() => (this.found.hasValue() ? this.found.value().rows : []));
  private readonly chosen = signal(0);
  protected readonly at = computed(() => Math.min(this.chosen(), this.rows().length - 1));

  protected type(text: string): void {
    this.text.set(text);
    this.chosen.set(0);
  }

  protected walk(event: KeyboardEvent): void {
    const step = { ArrowDown: 1, ArrowUp: -1 }[event.key];
    if (step !== undefined) {
      event.preventDefault();
      this.chosen.set(Math.max(0, Math.min(this.at() + step, this.rows().length - 1)));
    }
    const row = this.rows()[this.at()];
    if (event.key === 'Enter' && row) {
      event.preventDefault();
      this.open(row);
    }
  }

  protected open(row: Found): void {
    this.dialog.close();
    void this.router.navigateByUrl(`${PLACES[row.kind].path}/${row.id}`);
  }
}
