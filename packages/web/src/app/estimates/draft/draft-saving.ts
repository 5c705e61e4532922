import { computed, DestroyRef, effect, inject, Injectable, signal, untracked } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import type { Revision, SaveRevision } from '@bookmatch/common/estimates/revision-contract';
import type { FieldProblem } from '@bookmatch/common/problems/problem';
import { Store } from '@ngrx/store';
import { debounceTime, tap } from 'rxjs';
import { isStale, isUncertain } from '../../platform/api/problem-kinds';
import { changedFields } from '../../ui/form-errors/changed-fields';
import { placeFieldProblems } from '../../ui/form-errors/field-problems';
import type { RevisionRef } from '../estimates-api';
import { EstimatesPage } from '../state/estimates.actions';
import { selectDraft } from '../state/estimates.selectors';
import { readDraft } from './draft-content';
import { DraftEditor } from './draft-editor';

const PAUSE_MS = 800;
const TRY_AGAIN_MS = 5_000;

/** How the draft on the screen stands to the one that is kept. */
export type Standing = 'saved' | 'waiting' | 'saving' | 'wrong' | 'offline' | 'conflict' | 'refused';

/** Saves the draft by itself a moment after the last key, and keeps what is typed through everything that goes wrong. */
@Injectable()
export class DraftSaving {
  private readonly store = inject(Store);
  private readonly editor = inject(DraftEditor);
  private readonly outcome = this.store.selectSignal(selectDraft);

  private ref: RevisionRef | null = null;
  private timer: ReturnType<typeof setTimeout> | undefined;
  /** What the server had when this screen last agreed with it. */
  private readonly base = signal<Revision | null>(null);
  private readonly unsent = signal(false);
  private readonly wrong = signal(0);
  /** Why the server will not take it; null while nothing stands in the way. */
  readonly refusal = signal<'conflict' | 'refused' | null>(null);

  readonly problem = computed(() => this.outcome().problem);
  readonly wrongFields = this.wrong.asReadonly();
  readonly standing = computed<Standing>(() => {
    const { status, problem } = this.outcome();
    const refusal = this.refusal();
    if (refusal) return refusal;
    if (status === 'saving') return 'saving';
    if (status === 'failed' && problem && isUncertain(problem)) return 'offline';
    if (this.wrong() > 0) return 'wrong';
    return this.unsent() ? 'waiting' : 'saved';
  });
  readonly settled = computed(() => this.standing() === 'saved');

  constructor() {
    this.editor.edits
      .pipe(
        tap(() => this.unsent.set(true)),
        debounceTime(PAUSE_MS),
        takeUntilDestroyed(),
      )
      .subscribe(() => this.save());
    effect(() => {
      if (this.outcome().status === 'failed') untracked(() => this.afterFailure());
    });
    inject(DestroyRef).onDestroy(() => {
      clearTimeout(this.timer);
      this.flush();
    });
  }

  /** Takes a revision up as the server has it. */
  start(ref: RevisionRef, revision: Revision): void {
    this.ref = ref;
    this.base.set(revision);
    this.unsent.set(false);
    this.wrong.set(0);
    this.refusal.set(null);
    this.store.dispatch(EstimatesPage.editorOpened());
  }

  /** The server agrees with what was sent last. */
  agree(revision: Revision): void {
    if (!this.refusal()) this.base.set(revision);
  }

  /** Does not wait for the pause: what was typed goes now. */
  flush(): void {
    if (this.unsent()) this.save();
  }

  /** Sends what stands on the screen, if it can be sent. */
  save(): void {
    if (!this.ref || this.refusal()) return;
    const content = this.read();
    if (!content) return;
    this.unsent.set(false);
    this.store.dispatch(EstimatesPage.draftEdited({ draft: this.ref, content }));
  }

  /** Over what somebody else saved: their version was read meanwhile, so this one counts. */
  keepMine(): void {
    this.refusal.set(null);
    this.save();
  }

  /** Which parts somebody else changed, in words. */
  changedBy(stored: Revision): string[] {
    const base = this.base();
    return base ? changedFields(base, stored, PARTS) : [];
  }

  /** What is typed, or null with the sentence at each field that keeps it from being sent. */
  read(): SaveRevision | null {
    const form = this.editor.form();
    const read = readDraft(form.getRawValue());
    if ('content' in read && form.valid) {
      this.wrong.set(0);
      return read.content;
    }
    this.showWrong('problems' in read ? read.problems : []);
    return null;
  }

  private afterFailure(): void {
    const { problem } = this.outcome();
    if (!problem) return;
    this.unsent.set(true);
    if (isUncertain(problem)) {
      clearTimeout(this.timer);
      this.timer = setTimeout(() => this.save(), TRY_AGAIN_MS);
      return;
    }
    if (isStale(problem)) this.refusal.set('conflict');
    else if (problem.code === 'conflict') this.refusal.set('refused');
    else this.showWrong(problem.fields ?? []);
  }

  private showWrong(problems: readonly FieldProblem[]): void {
    placeFieldProblems(this.editor.form(), problems);
    this.wrong.set(Math.max(1, problems.length));
  }
}

const PARTS = {
  rooms: 'rooms and lines',
  discountCents: 'discount',
  taxRule: 'tax rule',
  taxRate: 'tax rate',
  validUntil: 'valid until',
  billingSchedule: 'billing schedule',
  intro: 'introduction',
  exclusions: 'what is not included',
  terms: 'terms',
} as const;
