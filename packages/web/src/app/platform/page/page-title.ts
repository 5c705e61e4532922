import { inject, Injectable } from '@angular/core';
import { Title } from '@angular/platform-browser';
import { TitleStrategy, type RouterStateSnapshot } from '@angular/router';
import { CurrentShop } from '../session/current-shop';

/** The window's title: the screen, then the shop. A screen about one thing calls `show` when it knows its name. */
@Injectable({ providedIn: 'root' })
export class PageTitle extends TitleStrategy {
  private readonly title = inject(Title);
  private readonly shop = inject(CurrentShop);

  override updateTitle(snapshot: RouterStateSnapshot): void {
    this.show(this.buildTitle(snapshot) ?? '');
  }

  show(name: string): void {
    const place = this.shop.name() ?? 'Bookmatch';
    this.title.setTitle(name ? `${name} · ${place}` : place);
  }
}
