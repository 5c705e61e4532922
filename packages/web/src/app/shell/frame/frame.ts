import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { MatIcon } from '@angular/material/icon';
import { RouterOutlet } from '@angular/router';
import { CurrentShop } from '../../platform/session/current-shop';
import { BottomBar } from '../bottom-bar/bottom-bar';
import { Nav } from '../nav/nav';
import { OfflineNote } from '../offline-note/offline-note';
import { PersonMenu } from '../person-menu/person-menu';
import { injectFindWords } from '../quick-find/find-words';
import { QuickFindOpener } from '../quick-find/quick-find-opener';
import { SlotOutlet } from '../slot-outlet';
import { BANNER_SLOT, CLOCK_SLOT } from '../slots';
import { focusOnArrival } from './focus-on-arrival';

/** The frame around every screen of a shop. */
@Component({
  selector: 'bm-frame',
  imports: [BottomBar, MatIcon, Nav, OfflineNote, PersonMenu, RouterOutlet, SlotOutlet],
  templateUrl: './frame.html',
  styleUrl: './frame.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { '(document:keydown)': 'shortcut($event)' },
})
export class Frame {
  protected readonly finder = inject(QuickFindOpener);
  protected readonly findWords = injectFindWords();
  protected readonly readOnly = inject(CurrentShop).readOnly;
  protected readonly clock = inject(CLOCK_SLOT);
  protected readonly banner = inject(BANNER_SLOT);
  protected readonly shortcutName = /Mac|iPhone|iPad/.test(navigator.userAgent) ? '⌘ K' : 'Ctrl K';

  constructor() {
    focusOnArrival('#screen');
  }

  protected shortcut(event: KeyboardEvent): void {
    if (event.key.toLowerCase() !== 'k' || !(event.ctrlKey || event.metaKey)) return;
    event.preventDefault();
    this.finder.open();
  }

  protected skip(event: Event, screen: HTMLElement): void {
    event.preventDefault();
    screen.focus();
  }
}
