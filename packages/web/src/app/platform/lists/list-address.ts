import { computed, inject, type Signal, signal } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { ActivatedRoute, Router, type Params } from '@angular/router';

/** What the address says about a list: search, order, place and the slice's own filters, all as text. */
export type ListQuery = Readonly<Partial<Record<string, string>>>;

export type ListAddress = {
  readonly query: Signal<ListQuery>;
  readonly hasPrevious: Signal<boolean>;
  /** True when a search or a filter narrows the list, so that empty does not mean nothing is there. */
  readonly narrowed: Signal<boolean>;
  search(text: string): void;
  sortBy(sort: string): void;
  filterBy(name: string, value: string | null): void;
  clear(): void;
  next(cursor: string): void;
  previous(): void;
};

/**
 * Keeps a list's search, order and filters in the address, where they survive reload, back and a shared link.
 * Call it in a field of the list's screen, with the names of the slice's own filters.
 */
export function injectListAddress(...filters: readonly string[]): ListAddress {
  const route = inject(ActivatedRoute);
  const router = inject(Router);
  const names = ['q', 'sort', 'after', ...filters];
  const params = toSignal(route.queryParams, { initialValue: route.snapshot.queryParams });
  const query = computed(() => pick(params(), names), { equal: sameText });
  const visited = signal<readonly (string | null)[]>([]);

  /** Whatever changes what is listed starts again on the first page. */
  const change = (changes: Params): void => {
    visited.set([]);
    void go({ ...changes, after: null });
  };
  const go = (queryParams: Params): Promise<boolean> =>
    router.navigate([], { relativeTo: route, queryParams, queryParamsHandling: 'merge' });

  return {
    query,
    hasPrevious: computed(() => query()['after'] !== undefined),
    narrowed: computed(() => ['q', ...filters].some((name) => query()[name] !== undefined)),
    search: (text) => change({ q: text.trim() || null }),
    sortBy: (sort) => change({ sort }),
    filterBy: (name, value) => change({ [name]: value || null }),
    clear: () => change(Object.fromEntries(['q', ...filters].map((name) => [name, null]))),
    next: (cursor) => {
      visited.update((stack) => [...stack, query()['after'] ?? null]);
      void go({ after: cursor });
    },
    /** Cursors only lead on, so the way back is remembered; after a reload it leads to the first page. */
    previous: () => {
      const after = visited().at(-1) ?? null;
      visited.update((stack) => stack.slice(0, -1));
      void go({ after });
    },
  };
}

function pick(params: Params, names: readonly string[]): ListQuery {
  const present = names.filter((name) => typeof params[name] === 'string' && params[name] !== '');
  return Object.fromEntries(present.map((name) => [name, params[name] as string]));
}

const sameText = (a: ListQuery, b: ListQuery): boolean => JSON.stringify(a) === JSON.stringify(b);
