import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  signal,
  type OnInit,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatProgressBar } from '@angular/material/progress-bar';
import { ROLE_NAMES } from '@bookmatch/common/access/roles';
import type { Session } from '@bookmatch/common/accounts/accounts-contract';
import type {
  AcceptInvitation as Acceptance,
  InvitationOffer,
} from '@bookmatch/common/shops/members-contract';
import { Store } from '@ngrx/store';
import { Submission } from '../../platform/forms/submission';
import { PageLoad } from '../../platform/session/page-load';
import { SessionPage } from '../../platform/session/session.actions';
import { sessionFeature } from '../../platform/session/session.state';
import { ProblemNote } from '../../ui/problem-note/problem-note';
import { AccountsApiClient } from '../accounts-api';
import { EntryFrame } from '../entry-frame/entry-frame';
import { SignInForm } from '../sign-in-form/sign-in-form';
import { NewcomerForm } from './newcomer-form';

/** Where the letter's link leads: somebody new gives a name and a password, somebody known signs in. */
@Component({
  selector: 'bm-accept-invitation',
  imports: [EntryFrame, MatButton, MatProgressBar, NewcomerForm, ProblemNote, SignInForm],
  templateUrl: './accept-invitation.html',
  styleUrl: './accept-invitation.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class AcceptInvitation implements OnInit {
  /** From the address. */
  readonly token = input('');

  private readonly accounts = inject(AccountsApiClient);
  private readonly page = inject(PageLoad);
  private readonly store = inject(Store);
  private readonly person = this.store.selectSignal(sessionFeature.selectPerson);
  protected readonly roleNames = ROLE_NAMES;
  protected readonly looking = new Submission();
  protected readonly joining = new Submission();
  protected readonly offer = signal<InvitationOffer | null>(null);
  protected readonly heading = computed(() => {
    const offer = this.offer();
    return offer ? `Join ${offer.shopName}` : 'Your invitation';
  });
  /** What the person has to do first. */
  protected readonly step = computed(() => {
    const offer = this.offer();
    const person = this.person();
    if (!offer) return 'look';
    if (person) return person.email === offer.email ? 'join' : 'somebody-else';
    return offer.needsAccount ? 'become-somebody' : 'sign-in';
  });

  ngOnInit(): void {
    this.looking.run(this.accounts.invitationOffer(this.token()), (offer) => this.offer.set(offer));
  }

  protected join(newcomer: Omit<Acceptance, 'token'> = {}): void {
    const known = new Set(
      this.store
        .selectSignal(sessionFeature.selectMemberships)()
        .map(({ slug }) => slug),
    );
    this.joining.run(this.accounts.acceptInvitation({ token: this.token(), ...newcomer }), (session) => {
      this.page.go(joinedPath(session, known));
    });
  }

  protected signOut(): void {
    this.store.dispatch(SessionPage.signOutPressed({ everywhere: false }));
  }
}

/** To the shop that was not there before; to the front door if it cannot be told. */
function joinedPath({ memberships }: Session, known: ReadonlySet<string>): string {
  const joined = memberships.filter(({ slug }) => !known.has(slug));
  return joined.length === 1 && joined[0] ? `/s/${joined[0].slug}/` : '/';
}
