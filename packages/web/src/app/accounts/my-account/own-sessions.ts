import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { Store } from '@ngrx/store';
import { SessionPage } from '../../platform/session/session.actions';
import { DateTextPipe } from '../../ui/formats/date-text.pipe';
import { Panel } from '../../ui/panel/panel';
import { ProblemNote } from '../../ui/problem-note/problem-note';
import { Skeleton } from '../../ui/skeleton/skeleton';
import { StatusChip } from '../../ui/status-chip/status-chip';
import { OwnSessionsPage } from '../state/own-sessions.actions';
import { ownSessionsFeature } from '../state/own-sessions.state';
import { deviceName } from './device-name';

/** Where the person is signed in, with a way to end each. */
@Component({
  selector: 'bm-own-sessions',
  imports: [DateTextPipe, MatButton, Panel, ProblemNote, Skeleton, StatusChip],
  templateUrl: './own-sessions.html',
  styleUrl: './own-sessions.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class OwnSessions {
  private readonly store = inject(Store);
  protected readonly sessions = this.store.selectSignal(ownSessionsFeature.selectSessions);
  protected readonly loaded = this.store.selectSignal(ownSessionsFeature.selectLoaded);
  protected readonly problem = this.store.selectSignal(ownSessionsFeature.selectProblem);
  protected readonly deviceName = deviceName;

  constructor() {
    this.load();
  }

  protected load(): void {
    this.store.dispatch(OwnSessionsPage.opened());
  }

  protected end(id: string): void {
    this.store.dispatch(OwnSessionsPage.endPressed({ id }));
  }

  protected endAll(): void {
    this.store.dispatch(SessionPage.signOutPressed({ everywhere: true }));
  }
}
