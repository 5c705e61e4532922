import { DOCUMENT, inject, InjectionToken } from '@angular/core';

const BELOW_A_SHOP = /^\/s\/([a-z0-9-]+)(?=\/|$)/;

/** The slug of the shop that the address is about, or null outside of any shop. */
export function shopSlugOf(pathname: string): string | null {
  return BELOW_A_SHOP.exec(pathname)?.[1] ?? null;
}

/** What the router takes as its base, so that a slice writes `/jobs/…` and never the shop. */
export function routerBaseOf(pathname: string): string {
  const slug = shopSlugOf(pathname);
  return slug === null ? '/' : `/s/${slug}/`;
}

/** A path of this site as it was asked for, or the given one: a redirect never leaves home. */
export function localPath(asked: string | null | undefined, otherwise: string, origin: string): string {
  if (!asked?.startsWith('/')) return otherwise;
  try {
    const url = new URL(asked, origin);
    return url.origin === origin ? url.pathname + url.search + url.hash : otherwise;
  } catch {
    return otherwise;
  }
}

/** The shop of this page load. Changing shop is a new page load, so this never changes while the page lives. */
export const SHOP_SLUG = new InjectionToken<string | null>('SHOP_SLUG', {
  providedIn: 'root',
  factory: () => shopSlugOf(inject(DOCUMENT).location.pathname),
});
