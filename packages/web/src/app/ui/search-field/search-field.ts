import { ChangeDetectionStrategy, Component, DestroyRef, inject, input, output } from '@angular/core';
import { MatIcon } from '@angular/material/icon';

const TYPING_PAUSE_MS = 300;

/** A quiet search box for the head of a list; tells what was typed after a short pause, or at once on Enter. */
@Component({
  selector: 'bm-search-field',
  imports: [MatIcon],
  template: `
    <mat-icon svgIcon="search" />
    <input
      #field
      type="search"
      autocomplete="off"
      maxlength="100"
      [attr.aria-label]="label()"
      [placeholder]="label()"
      [value]="value()"
      (input)="later(field.value)"
      (keydown.enter)="now(field.value)"
      (search)="now(field.value)"
    />
  `,
  styleUrl: './search-field.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SearchField {
  readonly label = input.required<string>();
  readonly value = input('');
  readonly searched = output<string>();
  private pause: ReturnType<typeof setTimeout> | undefined;

  constructor() {
    inject(DestroyRef).onDestroy(() => clearTimeout(this.pause));
  }

  protected later(text: string): void {
    clearTimeout(this.pause);
    this.pause = setTimeout(() => this.searched.emit(text), TYPING_PAUSE_MS);
  }

  protected now(text: string): void {
    clearTimeout(this.pause);
    if (text.trim() !== this.value()) this.searched.emit(text);
  }
}
