import { CdkDropListGroup } from '@angular/cdk/drag-drop';
import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  untracked,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatIcon } from '@angular/material/icon';
import type { Estimate } from '@bookmatch/common/estimates/estimates-contract';
import { MAX_ROOMS } from '@bookmatch/common/estimates/revision-contract';
import { Store } from '@ngrx/store';
import { EmptyState } from '../../ui/empty-state/empty-state';
import { MoneyPipe } from '../../ui/formats/money.pipe';
import { Panel } from '../../ui/panel/panel';
import { warnBeforeUnload } from '../../ui/unsaved-changes/unsaved-changes';
import { DraftEditor } from '../draft/draft-editor';
import { DraftSaving } from '../draft/draft-saving';
import { counted } from '../estimate-names';
import { PricePanel } from '../price-panel/price-panel';
import { RoomEditor } from '../room-editor/room-editor';
import { ScheduleEditor } from '../schedule-editor/schedule-editor';
import { EstimatesPage } from '../state/estimates.actions';
import { selectOperations } from '../state/estimates.selectors';
import { WordsEditor } from '../words-editor/words-editor';

/** Where a draft is written: rooms and lines, price, schedule and words. It saves by itself. */
@Component({
  selector: 'bm-draft-builder',
  imports: [
    CdkDropListGroup,
    EmptyState,
    MatButton,
    MatIcon,
    MoneyPipe,
    Panel,
    PricePanel,
    RoomEditor,
    ScheduleEditor,
    WordsEditor,
  ],
  providers: [DraftEditor, DraftSaving],
  templateUrl: './draft-builder.html',
  styleUrl: './draft-builder.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class DraftBuilder {
  readonly estimate = input.required<Estimate>();

  private readonly store = inject(Store);
  protected readonly editor = inject(DraftEditor);
  readonly saving = inject(DraftSaving);
  protected readonly operations = this.store.selectSignal(selectOperations);
  protected readonly mostRooms = MAX_ROOMS;
  private taken: string | null = null;

  protected readonly words = computed(() => {
    const fields = counted(this.saving.wrongFields(), 'field needs', 'fields need');
    return {
      saved: 'Saved',
      waiting: 'Not saved yet',
      saving: 'Saving',
      wrong: `Not saved: ${fields} correcting`,
      offline: 'No connection. What you typed stays here and is saved when it is back.',
      conflict: 'Somebody else saved this estimate meanwhile',
      refused: this.saving.problem()?.detail ?? '',
    }[this.saving.standing()];
  });
  /** The other version is here: until then there is nothing to choose between. */
  protected readonly theirs = computed(() => {
    const { currentRevision } = this.estimate();
    const version = this.saving.problem()?.facts?.['version'];
    return typeof version === 'number' && currentRevision.version >= version
      ? this.saving.changedBy(currentRevision).join(', ')
      : null;
  });

  constructor() {
    warnBeforeUnload(() => this.hasUnsavedChanges());
    effect(() => {
      const { currentRevision } = this.estimate();
      untracked(() => {
        if (this.taken !== currentRevision.id) this.take();
        else this.saving.agree(currentRevision);
      });
    });
  }

  /** What can be saved is saved on the way out; the rest would be lost. */
  hasUnsavedChanges(): boolean {
    return !['saved', 'saving', 'waiting'].includes(this.saving.standing());
  }

  /** Takes up what the server has, in the place of what stands here. */
  protected take(): void {
    const { id, currentRevision } = this.estimate();
    this.taken = currentRevision.id;
    this.editor.fill(currentRevision);
    this.saving.start({ estimateId: id, revisionId: currentRevision.id }, currentRevision);
  }

  /** The revision was sent under the typing hands: what was typed becomes a new one. */
  protected rescue(): void {
    this.editor.renewIds();
    const content = this.saving.read();
    if (content)
      this.store.dispatch(EstimatesPage.rescuePressed({ estimateId: this.estimate().id, content }));
  }
}
