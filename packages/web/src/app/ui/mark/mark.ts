import { ChangeDetectionStrategy, Component } from '@angular/core';

/** Our mark: two mirrored sets of grain lines, planned and built, about a gap. */
@Component({
  selector: 'bm-mark',
  template: `
    <svg viewBox="0 0 32 32" width="32" height="32" fill="none" stroke-width="2" stroke-linecap="round">
      <g class="planned">
        <path d="M5 5C9 11 9 21 5 27" />
        <path d="M9 4C12.5 11 12.5 21 9 28" />
        <path d="M13.5 3V29" />
      </g>
      <g class="built">
        <path d="M27 5C23 11 23 21 27 27" />
        <path d="M23 4C19.5 11 19.5 21 23 28" />
        <path d="M18.5 3V29" />
      </g>
    </svg>
  `,
  styleUrl: './mark.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { 'aria-hidden': 'true' },
})
export class Mark {}
