import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  signal,
  untracked,
} from '@angular/core';
import { MatButton, MatIconButton } from '@angular/material/button';
import { MatDialog } from '@angular/material/dialog';
import { MatIcon } from '@angular/material/icon';
import { MatProgressBar } from '@angular/material/progress-bar';
import type { JobFile } from '@bookmatch/common/jobs/job-files-contract';
import { Store } from '@ngrx/store';
import { injectCan } from '../../platform/session/ability';
import { Confirm } from '../../ui/confirm/confirm';
import { DateTextPipe } from '../../ui/formats/date-text.pipe';
import { Panel } from '../../ui/panel/panel';
import { ProblemNote } from '../../ui/problem-note/problem-note';
import { JobsApiClient } from '../jobs-api';
import { PhotoView, type PhotoViewSubject } from '../photo-view/photo-view';
import { JobsPage } from '../state/jobs.actions';
import { selectFiles } from '../state/jobs.selectors';
import { ACCEPTED_FILES, fileKindName, fileSize, isPhoto } from './file-words';
import { UploadQueue } from './upload-queue';

/** A job's files and photos: a grid that files are dropped on, and that a phone's camera adds to. */
@Component({
  selector: 'bm-job-files',
  imports: [DateTextPipe, MatButton, MatIcon, MatIconButton, MatProgressBar, Panel, ProblemNote],
  templateUrl: './job-files.html',
  styleUrl: './job-files.scss',
  providers: [UploadQueue],
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: {
    '[class.over]': 'draggedOver()',
    '(dragover)': 'dragOver($event)',
    '(dragleave)': 'draggedOver.set(false)',
    '(drop)': 'drop($event)',
  },
})
export class JobFiles {
  readonly jobId = input.required<string>();

  private readonly store = inject(Store);
  private readonly api = inject(JobsApiClient);
  private readonly dialog = inject(MatDialog);
  private readonly confirm = inject(Confirm);
  private readonly queue = inject(UploadQueue);
  protected readonly can = injectCan();
  protected readonly files = this.store.selectSignal(selectFiles);
  protected readonly uploads = this.queue.uploads;
  protected readonly draggedOver = signal(false);
  protected readonly mayAdd = computed(() => this.can('create', 'JobFile'));
  protected readonly accepted = ACCEPTED_FILES;
  protected readonly kindName = fileKindName;
  protected readonly sizeOf = fileSize;

  protected readonly tiles = computed(() =>
    this.files().rows.map((file) => ({
      file,
      photo: isPhoto(file),
      contentUrl: this.api.fileUrl(this.jobId(), file.id, 'content'),
      thumbnailUrl: file.hasThumbnail ? this.api.fileUrl(this.jobId(), file.id, 'thumbnail') : null,
    })),
  );

  constructor() {
    effect(() => this.load());
  }

  protected load(): void {
    const jobId = this.jobId();
    untracked(() => this.store.dispatch(JobsPage.filesOpened({ jobId })));
  }

  protected choose(input: HTMLInputElement): void {
    this.add([...(input.files ?? [])]);
    // The same file can be chosen again after it was refused.
    input.value = '';
  }

  protected dragOver(event: DragEvent): void {
    if (!this.mayAdd() || !event.dataTransfer?.types.includes('Files')) return;
    event.preventDefault();
    this.draggedOver.set(true);
  }

  protected drop(event: DragEvent): void {
    if (!this.draggedOver()) return;
    event.preventDefault();
    this.draggedOver.set(false);
    this.add([...(event.dataTransfer?.files ?? [])]);
  }

  protected retry(key: number): void {
    this.queue.retry(key);
  }

  protected letGo(key: number): void {
    this.queue.letGo(key);
  }

  protected open(fileId: string): void {
    const photos = this.tiles().filter(({ photo }) => photo);
    const data: PhotoViewSubject = {
      photos: photos.map(({ file, contentUrl }) => ({ name: file.name, url: contentUrl })),
      at: photos.findIndex(({ file }) => file.id === fileId),
    };
    this.dialog.open(PhotoView, {
      data,
      ariaLabel: 'Photos of the job',
      maxWidth: '100vw',
      width: '100vw',
      height: '100dvh',
    });
  }

  protected remove({ id, name }: JobFile): void {
    const question = {
      title: `Remove ${name}?`,
      text: 'The file is gone for everybody in the shop.',
      action: 'Remove',
      tone: 'harm',
    } as const;
    this.confirm.ask(question).subscribe((answer) => {
      if (answer) this.store.dispatch(JobsPage.fileRemovalConfirmed({ jobId: this.jobId(), fileId: id }));
    });
  }

  private add(files: readonly File[]): void {
    if (this.mayAdd() && files.length > 0) this.queue.add(this.jobId(), files);
  }
}
