import { A11yModule } from '@angular/cdk/a11y';
import { OverlayModule } from '@angular/cdk/overlay';
import { NgTemplateOutlet } from '@angular/common';
import {
  ChangeDetectionStrategy,
  Component,
  contentChild,
  Directive,
  inject,
  input,
  signal,
  TemplateRef,
} from '@angular/core';
import { MatIconButton } from '@angular/material/button';
import { MatIcon } from '@angular/material/icon';

/** One thing that a figure is made of. */
export type WorkingLine = { name: string; note?: string; figure: string };

/** What stands under the lines, or in their place, made only when the working is opened. */
@Directive({ selector: 'ng-template[bmWorkingBody]' })
export class WorkingBody {
  readonly template = inject<TemplateRef<void>>(TemplateRef);
}

let workings = 0;

/**
 * A figure that opens what it is made of:
 * `<bm-working of="Material" [lines]="lines()">{{ cents | money }}</bm-working>`.
 */
@Component({
  selector: 'bm-working',
  imports: [A11yModule, MatIcon, MatIconButton, NgTemplateOutlet, OverlayModule],
  templateUrl: './working.html',
  styleUrl: './working.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Working {
  /** What the figure is: "Material". */
  readonly of = input.required<string>();
  readonly lines = input<readonly WorkingLine[]>([]);
  /** The figure again, under the line, when the lines add up to it. */
  readonly total = input<string>();

  protected readonly body = contentChild(WorkingBody);
  protected readonly open = signal(false);
  protected readonly headingId = `bm-working-${workings++}`;

  protected toggle(): void {
    this.open.update((open) => !open);
  }

  protected close(): void {
    this.open.set(false);
  }
}
