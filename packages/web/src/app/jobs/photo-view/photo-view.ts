import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { MatIconButton } from '@angular/material/button';
import { MAT_DIALOG_DATA, MatDialogClose } from '@angular/material/dialog';
import { MatIcon } from '@angular/material/icon';

export type PhotoViewSubject = {
  photos: readonly { name: string; url: string }[];
  /** Which one to begin with. */
  at: number;
};

/** Photos one at a time over the whole screen; arrow keys and buttons go on, Escape closes. */
@Component({
  selector: 'bm-photo-view',
  imports: [MatDialogClose, MatIcon, MatIconButton],
  templateUrl: './photo-view.html',
  styleUrl: './photo-view.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { '(document:keydown)': 'walk($event)' },
})
export class PhotoView {
  protected readonly photos = inject<PhotoViewSubject>(MAT_DIALOG_DATA).photos;
  protected readonly at = signal(Math.max(0, inject<PhotoViewSubject>(MAT_DIALOG_DATA).at));
  protected readonly photo = computed(() => this.photos[this.at()]);

  /** Past the last comes the first. */
  protected step(by: number): void {
    this.at.update((at) => (at + by + this.photos.length) % this.photos.length);
  }

  protected walk(event: KeyboardEvent): void {
    const by = { ArrowLeft: -1, ArrowRight: 1 }[event.key];
    if (by === undefined) return;
    event.preventDefault();
    this.step(by);
  }
}
