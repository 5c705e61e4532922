import {
  afterNextRender,
  ChangeDetectionStrategy,
  Component,
  computed,
  ElementRef,
  inject,
  Injector,
  signal,
} from '@angular/core';
import { rxResource, toObservable, toSignal } from '@angular/core/rxjs-interop';
import { MatDialogRef } from '@angular/material/dialog';
import { MatButton } from '@angular/material/button';
import { MatIcon } from '@angular/material/icon';
import { Router } from '@angular/router';
import { quickFindSchema, type Found } from '@bookmatch/common/today/quick-find-contract';
import { debounceTime } from 'rxjs';
import { ApiClient } from '../../platform/api/api-client';
import { injectShopUrl } from '../../platform/session/current-shop';
import { injectFindWords } from './find-words';
import { PLACES } from './places';

const TYPING_PAUSE_MS = 200;

/** Finds anything of the shop by its name or number, from anywhere, by keyboard alone. */
@Component({
  selector: 'bm-quick-find',
  imports: [MatButton, MatIcon],
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
  private readonly injector = inject(Injector);
  private readonly host = inject<ElementRef<HTMLElement>>(ElementRef).nativeElement;
  protected readonly places = PLACES;
  protected readonly words = injectFindWords();
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
  /** What is shown answers what is typed; until then Enter waits instead of opening what was found before. */
  protected readonly settled = computed(
    () => this.asked().trim() === this.text().trim() && !this.found.isLoading(),
  );

  protected type(text: string): void {
    this.text.set(text);
    this.chosen.set(0);
  }

  protected walk(event: KeyboardEvent): void {
    const last = this.rows().length - 1;
    const to = { ArrowDown: this.at() + 1, ArrowUp: this.at() - 1, PageDown: last, PageUp: 0 }[event.key];
    if (to !== undefined) {
      event.preventDefault();
      this.choose(Math.max(0, Math.min(to, last)));
    }
    const row = this.rows()[this.at()];
    if (event.key === 'Enter' && row && this.settled()) {
      event.preventDefault();
      this.open(row);
    }
  }

  protected open(row: Found): void {
    this.dialog.close();
    void this.router.navigateByUrl(`${PLACES[row.kind].path}/${row.id}`);
  }

  private choose(index: number): void {
    this.chosen.set(index);
    const reveal = () => this.host.querySelector('.at')?.scrollIntoView?.({ block: 'nearest' });
    afterNextRender(reveal, { injector: this.injector });
  }
}
