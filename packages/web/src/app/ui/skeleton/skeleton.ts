import { ChangeDetectionStrategy, Component, input } from '@angular/core';

/** A gray bar where a line will stand. */
@Component({
  selector: 'bm-skeleton',
  template: '',
  styleUrl: './skeleton.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { 'aria-hidden': 'true', '[style.width]': 'width()' },
})
export class Skeleton {
  readonly width = input('100%');
}
