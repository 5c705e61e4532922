import type { Action, Subject } from '@bookmatch/common/access/ability';
import type { Readable } from 'node:stream';
import type * as z from 'zod';
import type { GlobalScope, ShopScope } from '../database/scope.js';
import type { UnitOfWork } from '../database/unit-of-work.js';
import type { Stamp } from '../database/stamp.js';

export type Method = 'get' | 'post' | 'put' | 'patch' | 'delete';
type NoSchema = undefined;
/** The parameters a path names: `'/jobs/:id'` → `{ id: string }`. */
export type Params<Path extends string> = Path extends `${string}:${infer Name}/${infer Rest}`
  ? Record<Name, string> & Params<`/${Rest}`>
  : Path extends `${string}:${infer Name}`
    ? Record<Name, string>
    : Record<never, string>;
type Out<Schema> = Schema extends z.ZodType ? z.output<Schema> : undefined;

/** What every route says about itself: the OpenAPI page, the role matrix and the isolation test read it too. */
type Described<Path, Query, Body, Answer> = {
  method: Method;
  /** Below the kind's prefix; a parameter whose name ends in `Id` (or is `id`) is checked to be one. */
  path: Path;
  summary: string;
  query?: Query;
  body?: Body;
  /** What may leave: anything else the handler returned is dropped. Left out for 204. */
  answer?: Answer;
  status?: 200 | 201 | 202 | 204;
  /**
   * `key`: the request must carry an `Idempotency-Key`, and a repeat gets the first answer (the rule for POST).
   * `natural`: repeating does no harm by itself. Say why beside it.
   */
  repeat?: 'key' | 'natural';
  /**
   * `own`: the handler opens its own transactions, since it calls others in between. It gets `work` instead of relying
   * on one transaction around it.
   */
  transaction?: 'own';
  /** The body arrives as a file upload (`multipart/form-data`, field `file`) or as raw bytes. */
  upload?: 'file';
};

type Common<Path extends string, Query, Body> = {
  params: Params<Path>;
  query: Out<Query>;
  body: Out<Body>;
  file: UploadedFile | undefined;
  /** The request's `Idempotency-Key`; empty where the route needs none. */
  idempotencyKey: string;
  /** The version from `If-Match`, for routes with `versioned`. */
  version: number;
  stamp: Stamp;
  work: UnitOfWork;
  address: string;
  userAgent: string;
};
export type UploadedFile = { path: string; name: string; bytes: number };

/** A file to hand out instead of JSON. Always sent as an attachment unless `inline` and a type that cannot run script. */
export type Download = {
  download: { name: string; type: string; inline?: boolean; body: Readable | Buffer };
};

type Handled<Answer> = Promise<(Answer extends z.ZodType ? z.input<Answer> : void) | Download>;

export type ShopRequest<Path extends string, Query, Body> = Common<Path, Query, Body> & { scope: ShopScope };
export type ShopRoute<
  Path extends string = string,
  Query = NoSchema,
  Body = NoSchema,
  Answer = NoSchema,
> = Described<Path, Query, Body, Answer> & {
  /** Who may: checked on the kind of thing before anything is read. The row itself is checked by the service. */
  allow: readonly [Action, Subject];
  /** The request must say which version it changes. */
  versioned?: boolean;
  /** Writes are refused once the subscription has lapsed, unless this says otherwise. */
  whenLapsed?: 'allowed';
  handle(request: ShopRequest<Path, Query, Body>): Handled<Answer>;
};

export type AccountRequest<Path extends string, Query, Body> = Common<Path, Query, Body> & {
  scope: GlobalScope;
  /** The signed-in person; only `anyone` routes may find it empty. */
  personId: string | null;
  session: SessionControl;
};
export type AccountRoute<
  Path extends string = string,
  Query = NoSchema,
  Body = NoSchema,
  Answer = NoSchema,
> = Described<Path, Query, Body, Answer> & {
  allow: 'anyone' | 'signed-in';
  /** Names the limits of guessing that this route counts against. */
  limit?: 'guessing' | 'mailing';
  handle(request: AccountRequest<Path, Query, Body>): Handled<Answer>;
};

export type LinkRequest<Path extends string, Query, Body> = Common<Path, Query, Body> & {
  scope: ShopScope;
  link: ResolvedLink;
};
export type LinkRoute<
  Path extends string = string,
  Query = NoSchema,
  Body = NoSchema,
  Answer = NoSchema,
> = Described<Path, Query, Body, Answer> & {
  /** The kind of thing the customer's link must be about. */
  allow: 'estimate-link' | 'invoice-link' | 'any-link';
  handle(request: LinkRequest<Path, Query, Body>): Handled<Answer>;
};
export type ResolvedLink = {
  id: string;
  shopId: string;
  subject: 'estimate' | 'invoice';
  subjectId: string;
  customerId: string;
};

/** What a handler may do to the browser session. */
export type SessionControl = {
  id: string;
  signIn(personId: string): Promise<void>;
  signOut(): Promise<void>;
};

export type Route =
  | ({ kind: 'shop' } & ShopRoute<
      string,
      z.ZodType | undefined,
      z.ZodType | undefined,
      z.ZodType | undefined
    >)
  | ({ kind: 'account' } & AccountRoute<
      string,
      z.ZodType | undefined,
      z.ZodType | undefined,
      z.ZodType | undefined
    >)
  | ({ kind: 'link' } & LinkRoute<
      string,
      z.ZodType | undefined,
      z.ZodType | undefined,
      z.ZodType | undefined
    >);

export const PREFIXES = {
  shop: '/api/shops/:shopId',
  account: '/api/account',
  link: '/api/links/:token',
} as const;

/** A route of one shop. There is no default permission. */
export function shopRoute<
  const Path extends string,
  Query extends z.ZodType | undefined = undefined,
  Body extends z.ZodType | undefined = undefined,
  Answer extends z.ZodType | undefined = undefined,
>(route: ShopRoute<Path, Query, Body, Answer>): Route {
  return { kind: 'shop', ...route } as unknown as Route;
}

/** A route about the person, not about a shop. */
export function accountRoute<
  const Path extends string,
  Query extends z.ZodType | undefined = undefined,
  Body extends z.ZodType | undefined = undefined,
  Answer extends z.ZodType | undefined = undefined,
>(route: AccountRoute<Path, Query, Body, Answer>): Route {
  return { kind: 'account', ...route } as unknown as Route;
}

/** A route behind a customer's signed link. */
export function linkRoute<
  const Path extends string,
  Query extends z.ZodType | undefined = undefined,
  Body extends z.ZodType | undefined = undefined,
  Answer extends z.ZodType | undefined = undefined,
>(route: LinkRoute<Path, Query, Body, Answer>): Route {
  return { kind: 'link', ...route } as unknown as Route;
}

export const writes = (route: Route): boolean => route.method !== 'get';
export const needsKey = (route: Route): boolean =>
  (route.repeat ?? (route.method === 'post' ? 'key' : 'natural')) === 'key';
