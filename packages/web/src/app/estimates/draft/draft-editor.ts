import { computed, inject, Injectable, signal } from '@angular/core';
import { takeUntilDestroyed, toObservable } from '@angular/core/rxjs-interop';
import type { FormArray } from '@angular/forms';
import { billScheduleSoFar, refuseSchedule } from '@bookmatch/common/estimates/billing-schedule';
import { estimateTotals } from '@bookmatch/common/estimates/estimate-totals';
import type { Revision, RevisionContent } from '@bookmatch/common/estimates/revision-contract';
import { switchMap } from 'rxjs';
import { Notices } from '../../platform/page/notices';
import { contentSoFar } from './draft-content';
import {
  draftForm,
  lineForm,
  roomForm,
  stageForm,
  type DraftForm,
  type RoomForm,
  type StageForm,
} from './draft-form';

const NOTHING: RevisionContent = {
  validUntil: '',
  taxRule: 'on-price',
  taxRate: '0',
  intro: '',
  terms: '',
  exclusions: '',
  discountCents: 0,
  rooms: [],
  billingSchedule: [],
};

/** What moving and removing need of a form array, whatever its rows are. */
type RowList<Row> = {
  readonly length: number;
  at(index: number): Row;
  insert(index: number, row: Row): void;
  removeAt(index: number, options?: { emitEvent?: boolean }): void;
};

/** The draft on the desk: its form, what can be done to its rooms, lines and stages, and what it all comes to. */
@Injectable()
export class DraftEditor {
  private readonly notices = inject(Notices);
  /** Another form when another revision, or another version of it, was taken up. */
  readonly form = signal<DraftForm>(draftForm(NOTHING));
  /** Each change that was typed or made. */
  readonly edits = toObservable(this.form).pipe(switchMap((form) => form.valueChanges));

  private readonly typed = signal<RevisionContent>(NOTHING);
  /** What is typed, as far as it can be read. */
  readonly content = this.typed.asReadonly();
  readonly totals = computed(() => estimateTotals(this.typed()));
  readonly stages = computed(() => billScheduleSoFar(this.typed().billingSchedule, this.totals()));
  readonly scheduleProblem = computed(
    () => refuseSchedule(this.typed().billingSchedule, this.totals().totalCents)?.detail ?? null,
  );
  /** The line or room that was added last: it takes the focus when it appears. */
  readonly added = signal<string | null>(null);

  constructor() {
    this.edits.pipe(takeUntilDestroyed()).subscribe(() => this.recount());
  }

  get rooms(): FormArray<RoomForm> {
    return this.form().controls.rooms;
  }

  get schedule(): FormArray<StageForm> {
    return this.form().controls.billingSchedule;
  }

  /** Starts from what the server has. */
  fill(revision: Revision): void {
    this.form.set(draftForm(revision));
    this.recount();
  }

  /** Figures follow the typing. */
  private recount(): void {
    this.typed.set(contentSoFar(this.form().getRawValue()));
  }

  /** For a draft that becomes another revision: its rows are new ones. */
  renewIds(): void {
    const rooms = this.rooms.controls;
    const rows = [
      ...rooms,
      ...rooms.flatMap((room) => room.controls.lines.controls),
      ...this.schedule.controls,
    ];
    for (const { controls } of rows) controls.id.setValue(crypto.randomUUID());
  }

  addRoom(): void {
    const id = crypto.randomUUID();
    const room = roomForm({ id, name: `Room ${this.rooms.length + 1}`, lines: [] });
    this.rooms.push(room);
    this.addLine(room);
    this.added.set(id);
  }

  duplicateRoom(at: number): void {
    const { name, lines } = this.rooms.at(at).getRawValue();
    const copy = roomForm({ id: crypto.randomUUID(), name: `${name}, copy`.slice(0, 120), lines: [] });
    for (const line of lines) copy.controls.lines.push(lineForm({ ...line, id: crypto.randomUUID() }));
    this.rooms.insert(at + 1, copy);
  }

  removeRoom(at: number): void {
    this.removeWithUndo(this.rooms, at, 'Room deleted.');
  }

  moveRoom(from: number, to: number): void {
    move(this.rooms, from, this.rooms, to);
  }

  /** A new line is of the kind, unit and tax of the one before it: lines come in runs. */
  addLine(room: RoomForm, at = room.controls.lines.length): void {
    const { lines } = room.controls;
    const before = at > 0 ? lines.at(at - 1).getRawValue() : null;
    const line = lineForm({
      id: crypto.randomUUID(),
      kind: before?.kind ?? 'material',
      description: '',
      quantity: '1',
      unit: before?.unit ?? 'each',
      unitCostCents: null,
      unitPriceCents: null,
      operationId: null,
      plannedMinutesPerUnit: null,
      taxable: before?.taxable ?? true,
    });
    lines.insert(at, line);
    this.added.set(line.getRawValue().id);
  }

  duplicateLine({ controls: { lines } }: RoomForm, at: number): void {
    lines.insert(at + 1, lineForm({ ...lines.at(at).getRawValue(), id: crypto.randomUUID() }));
  }

  removeLine({ controls: { lines } }: RoomForm, at: number): void {
    this.removeWithUndo(lines, at, 'Line deleted.');
  }

  moveLine(from: RoomForm, at: number, to: RoomForm, place: number): void {
    move(from.controls.lines, at, to.controls.lines, place);
  }

  /** Past the first or last line, a line is carried on to the end or the beginning of the room beside. */
  carryLine(room: number, line: number, by: -1 | 1): void {
    const [from, to] = [this.rooms.at(room), this.rooms.controls[room + by]];
    if (to) this.moveLine(from, line, to, by < 0 ? to.controls.lines.length : 0);
  }

  addStage(): void {
    const share = { percent: '' };
    const id = crypto.randomUUID();
    this.schedule.push(stageForm({ id, name: '', share, deposit: false, due: 'by-hand' }));
    this.added.set(id);
  }

  removeStage(at: number): void {
    this.removeWithUndo(this.schedule, at, 'Stage deleted.');
  }

  moveStage(from: number, to: number): void {
    move(this.schedule, from, this.schedule, to);
  }

  private removeWithUndo<Row>(list: RowList<Row>, at: number, message: string): void {
    const removed = list.at(at);
    list.removeAt(at);
    this.notices.offer(message, 'Undo', () => list.insert(Math.min(at, list.length), removed));
  }
}

function move<Row>(from: RowList<Row>, at: number, to: RowList<Row>, place: number): void {
  if (place < 0 || place > to.length - (from === to ? 1 : 0)) return;
  const moved = from.at(at);
  from.removeAt(at, { emitEvent: from !== to });
  to.insert(place, moved);
}
