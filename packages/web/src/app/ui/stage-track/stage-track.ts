import {
  afterRenderEffect,
  ChangeDetectionStrategy,
  Component,
  computed,
  ElementRef,
  inject,
  input,
  output,
} from '@angular/core';
import { MatIcon } from '@angular/material/icon';

export type Stage = { key: string; name: string };

/** The stages of a thing in their order: those behind checked, the present one underlined. */
@Component({
  selector: 'bm-stage-track',
  imports: [MatIcon],
  template: `
    <ol [attr.aria-label]="label()">
      @for (step of steps(); track step.key) {
        <li [class]="step.state" [attr.aria-current]="step.state === 'current' ? 'step' : null">
          @if (step.open) {
            <button type="button" (click)="picked.emit(step.key)">
              <mat-icon class="bm-small-icon tick" svgIcon="check" />{{ step.name }}
            </button>
          } @else {
            <span><mat-icon class="bm-small-icon tick" svgIcon="check" />{{ step.name }}</span>
          }
          @if (step.state === 'done') {
            <span class="bm-spoken">done</span>
          }
        </li>
      }
    </ol>
  `,
  styleUrl: './stage-track.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
  // On a phone it slides sideways: where no stage takes the focus, the track itself does, to be slid by keyboard.
  host: {
    '[attr.role]': "still() ? 'group' : null",
    '[attr.aria-label]': 'still() ? label() : null',
    '[attr.tabindex]': 'still() ? 0 : null',
  },
})
export class StageTrack {
  readonly label = input('Stages');
  readonly stages = input.required<readonly Stage[]>();
  readonly current = input.required<string>();
  /** The stages that may be moved to from here; the others are only shown. */
  readonly reachable = input<readonly string[]>([]);
  readonly picked = output<string>();
  protected readonly still = computed(() => this.reachable().length === 0);

  private readonly host = inject<ElementRef<HTMLElement>>(ElementRef).nativeElement;

  constructor() {
    // On a narrow screen the track scrolls sideways: the present stage is the one to see first.
    afterRenderEffect(() => {
      this.current();
      const present = this.host.querySelector<HTMLElement>('[aria-current]');
      if (present)
        this.host.scrollLeft +=
          present.getBoundingClientRect().left - this.host.getBoundingClientRect().left - 16;
    });
  }

  protected readonly steps = computed(() => {
    const at = this.stages().findIndex(({ key }) => key === this.current());
    return this.stages().map((stage, index) => ({
      ...stage,
      state: index < at ? 'done' : index === at ? 'current' : 'ahead',
      open: this.reachable().includes(stage.key),
    }));
  });
}
