import { defineAbility } from '@bookmatch/common/access/ability';
import type { Role } from '@bookmatch/common/access/roles';
import { Router, type Express, type Request, type RequestHandler } from 'express';
import type * as z from 'zod';
import type { GlobalScope, ShopScope } from '../database/scope.js';
import type { Author, Stamp } from '../database/stamp.js';
import type { UnitOfWork } from '../database/unit-of-work.js';
import { answerOnce, hashRequest, type Answered } from './idempotency.js';
import { parseBody, parseIdempotencyKey, parseParams, parseQuery, parseVersion } from './parse.js';
import { notAllowed, notFound, ProblemError } from './problem-error.js';
import {
  needsKey,
  PREFIXES,
  writes,
  type Download,
  type ResolvedLink,
  type Route,
  type SessionControl,
} from './route.js';
import { sendAnswer } from './send-answer.js';
import type { UploadReader } from './uploads.js';

/** What one look-up tells of a member at each request. */
export type AccessOfMember = { memberId: string; role: Role; readOnly: boolean; timeZone: string };

/** What the platform needs to know of the slices above it, given to it by `compose.ts`. */
export type Access = {
  /** The member a person is in a shop, or null: read at every request, so that a change of role holds at once. */
  member(scope: ShopScope, personId: string): Promise<AccessOfMember | null>;
  /** What a customer's link opens, or a refusal thrown. Tries are counted by the network address. */
  link(scope: GlobalScope, token: string, address: string): Promise<ResolvedLink>;
  sessionOf(request: Request): { personId: string | null; control: SessionControl };
  /** Counts one try. @throws too-many-requests */
  limit(kind: LimitKind, request: Request): Promise<void>;
  /** Takes the tries back after a success. */
  forgive(kind: LimitKind, request: Request): Promise<void>;
};
export type LimitKind = 'guessing' | 'mailing';
export type MountOptions = { access: Access; work: UnitOfWork; uploads: UploadReader; clock: () => Date };

/**
 * Registers the routes: session → shop and ability → permission → schemas → unit of work → handler → answer schema.
 * Each first word of a path gets a router of its own, since Express tries a router's routes one by one.
 */
export function mountRoutes(app: Express, routes: readonly Route[], options: MountOptions): void {
  const routers = new Map<string, Router>();
  for (const route of routes) {
    const [, word = '', rest = ''] = /^(\/[^/]+)(.*)$/.exec(route.path) ?? [];
    const start = PREFIXES[route.kind] + word;
    const router = routers.get(start) ?? Router({ mergeParams: true });
    routers.set(start, router);
    router[route.method](rest || '/', handler(route, options));
  }
  for (const [start, router] of routers) app.use(start, router);
}

function handler(route: Route, options: MountOptions): RequestHandler {
  const enter = { shop: enterShop, account: enterAccount, link: enterLink }[route.kind];
  return async (request, response) => {
    const entered = await enter(route as never, request, options);
    const input = await readInput(route, request, options, entered);
    const answered = await perform(route, input, options, entered);
    if (route.kind === 'account' && route.limit) await options.access.forgive(route.limit, request);
    await sendAnswer(response, answered);
  };
}

/** Who is asking, and the part of the handler's request that depends on the kind of route. */
type Entered = {
  author: Author;
  /** Whose idempotency keys these are. */
  ownerId: string;
  open(scope: GlobalScope): Record<string, unknown>;
};

async function enterShop(
  route: Extract<Route, { kind: 'shop' }>,
  request: Request,
  options: MountOptions,
): Promise<Entered> {
  const { access } = options;
  const { personId } = access.sessionOf(request);
  if (!personId) throw new ProblemError('not-signed-in', 'Sign in to go on.');
  const { shopId } = parseParams(request) as { shopId: string };
  const member = await options.work.read(arrival(request, options), (scope) =>
    access.member(scope.forShop(shopId), personId),
  );
  if (!member) throw notFound();
  const ability = defineAbility({ memberId: member.memberId, role: member.role });
  const [action, subject] = route.allow;
  if (!ability.can(action, subject)) throw notAllowed();
  if (member.readOnly && writes(route) && route.whenLapsed !== 'allowed')
    throw new ProblemError(
      'subscription-lapsed',
      'The subscription has lapsed. Everything can still be read and exported.',
    );
  return {
    author: { kind: 'member', personId, memberId: member.memberId, role: member.role },
    ownerId: shopId,
    open: (scope) => ({ scope: scope.forShop(shopId, ability, member.timeZone) }),
  };
}

async function enterAccount(
  route: Extract<Route, { kind: 'account' }>,
  request: Request,
  { access }: MountOptions,
): Promise<Entered> {
  const { personId, control } = access.sessionOf(request);
  if (route.allow === 'signed-in' && !personId) throw new ProblemError('not-signed-in', 'Sign in to go on.');
  if (route.limit) await access.limit(route.limit, request);
  return {
    author: personId ? { kind: 'person', personId } : { kind: 'system' },
    ownerId: personId ?? NOBODY,
    open: (scope) => ({ scope, personId, session: control }),
  };
}
const NOBODY = '00000000-0000-0000-0000-000000000000';

async function enterLink(
  route: Extract<Route, { kind: 'link' }>,
  request: Request,
  options: MountOptions,
): Promise<Entered> {
  const token = String(request.params['token']);
  const link = await options.work.read(arrival(request, options), (scope) =>
    options.access.link(scope, token, request.ip ?? ''),
  );
  if (route.allow !== 'any-link' && route.allow !== `${link.subject}-link`) throw notFound();
  return {
    author: { kind: 'customer', linkId: link.id },
    ownerId: link.shopId,
    open: (scope) => ({ scope: scope.forShop(link.shopId), link }),
  };
}

/** The stamp of the look-ups before it is known who asks. */
function arrival(request: Request, { clock }: MountOptions): Stamp {
  return { author: { kind: 'system' }, requestId: String(request.id), now: clock() };
}

type Input = Record<string, unknown> & { stamp: Stamp; body: unknown; idempotencyKey: string };

async function readInput(
  route: Route,
  request: Request,
  options: MountOptions,
  entered: Entered,
): Promise<Input> {
  const query = parseQuery(route.query, request.query);
  const version = 'versioned' in route && route.versioned ? parseVersion(request) : 0;
  const idempotencyKey = needsKey(route) ? parseIdempotencyKey(request) : '';
  const file = route.upload ? await options.uploads(request) : undefined;
  const body = parseBody(route.body, request.body);
  const stamp: Stamp = { author: entered.author, requestId: String(request.id), now: options.clock() };
  return {
    params: parseParams(request),
    query,
    version,
    idempotencyKey,
    file,
    body,
    stamp,
    work: options.work,
    address: request.ip ?? '',
    userAgent: (request.get('user-agent') ?? '').slice(0, 300),
    requestHash: needsKey(route) ? hashRequest(route.method, request.originalUrl, request.body) : '',
  };
}

/** Runs the handler in the unit of work that the route asks for. */
async function perform(
  route: Route,
  input: Input,
  { work }: MountOptions,
  entered: Entered,
): Promise<Answered | Download> {
  const handle = route.handle as (request: unknown) => Promise<unknown>;
  const status = route.status ?? 200;
  const run = async (scope: GlobalScope) => {
    const result = await handle({ ...input, ...entered.open(scope) });
    return isDownload(result) ? result : { status, body: shape(route, result) };
  };
  if (!writes(route) || route.transaction === 'own') return work.read(input.stamp, run);
  if (!needsKey(route)) return work.transaction(input.stamp, run);
  const keyed = {
    ownerId: entered.ownerId,
    key: input.idempotencyKey,
    requestHash: String(input['requestHash']),
    now: input.stamp.now,
  };
  return work.transaction(input.stamp, (scope) =>
    answerOnce(scope.manager, keyed, async () => (await run(scope)) as Answered),
  );
}

function isDownload(result: unknown): result is Download {
  return typeof result === 'object' && result !== null && 'download' in result;
}

/** Only what the answer's schema names leaves. A handler that returns something else has a fault, not the client. */
function shape(route: Route, result: unknown): unknown {
  return route.answer ? (route.answer as z.ZodType).parse(result) : undefined;
}
