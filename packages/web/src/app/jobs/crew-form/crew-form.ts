import { ChangeDetectionStrategy, Component, computed, effect, inject, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatCheckbox } from '@angular/material/checkbox';
import {
  MAT_DIALOG_DATA,
  MatDialogActions,
  MatDialogContent,
  MatDialogRef,
  MatDialogTitle,
} from '@angular/material/dialog';
import { ROLE_NAMES } from '@bookmatch/common/access/roles';
import { Store } from '@ngrx/store';
import { ProblemNote } from '../../ui/problem-note/problem-note';
import { Skeleton } from '../../ui/skeleton/skeleton';
import { JobsPage } from '../state/jobs.actions';
import { selectJob, selectMembers, selectSave } from '../state/jobs.selectors';

/** Says who works on the job whose id it is opened with. */
@Component({
  selector: 'bm-crew-form',
  imports: [
    MatButton,
    MatCheckbox,
    MatDialogActions,
    MatDialogContent,
    MatDialogTitle,
    ProblemNote,
    Skeleton,
  ],
  templateUrl: './crew-form.html',
  styleUrl: './crew-form.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CrewForm {
  private readonly store = inject(Store);
  protected readonly dialog = inject<MatDialogRef<CrewForm>>(MatDialogRef);
  private readonly job = this.store.selectSignal(selectJob(inject<string>(MAT_DIALOG_DATA)));
  private readonly members = this.store.selectSignal(selectMembers);
  protected readonly save = this.store.selectSignal(selectSave);
  private readonly chosen = signal(
    new Set(this.job()?.assignedMembers.map(({ memberId }) => memberId) ?? []),
  );

  /** Members of the shop, and those who left but are on the job still. */
  protected readonly choices = computed(() => {
    const known = new Set(this.members().map(({ id }) => id));
    const left = (this.job()?.assignedMembers ?? []).filter(({ memberId }) => !known.has(memberId));
    return [
      ...this.members().map(({ id, name, role }) => ({ id, name, role: ROLE_NAMES[role] })),
      ...(known.size === 0 ? [] : left.map(({ memberId, name }) => ({ id: memberId, name, role: 'Left' }))),
    ].map((choice) => ({ ...choice, chosen: this.chosen().has(choice.id) }));
  });

  constructor() {
    this.store.dispatch(JobsPage.crewOpened());
    effect(() => {
      if (this.save().status === 'saved') this.dialog.close();
    });
  }

  protected choose(id: string, chosen: boolean): void {
    this.chosen.update((before) => {
      const after = new Set(before);
      if (chosen) after.add(id);
      else after.delete(id);
      return after;
    });
  }

  protected submit(): void {
    const job = this.job();
    if (!job) return;
    this.store.dispatch(
      JobsPage.crewSubmitted({
        job: { id: job.id, version: job.version },
        memberIds: [...this.chosen()],
      }),
    );
  }
}
