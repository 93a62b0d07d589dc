import type { NextRequest } from 'next/server';
import { z } from 'zod';
import { database, type Db } from '@/lib/database';
import { Forbidden, Malformed, NotSignedIn, Refusal, Unavailable } from '@/lib/errors/errors';
import { log } from '@/lib/log/log';
import { currentActor } from '@/lib/people/session';
import { ranks, type Actor, type Role } from '@/lib/people/actor';
import { writeAudit, type AuditLine } from '@/lib/audit/audit';
import { fieldErrors, parseBody, parsed, readBytes } from './body';
import { isOwnOrigin } from './origin';
import { problem, refused } from './problem';

export const METHODS = ['GET', 'HEAD', 'POST', 'PUT', 'PATCH', 'DELETE', 'OPTIONS'] as const;
export type Method = (typeof METHODS)[number];

type Anyone = { as: 'all'; actor: Actor | null } | { as: Role; actor: Actor };

/** What a use case is handed. `db` is a transaction wherever the method changes something. */
export type Context<As, Params, Query, Body, Subject> = {
  db: Db;
  actor: As extends 'all' ? Actor | null : Actor;
  params: Params;
  query: Query;
  body: Body;
  /** What `find` found: the thing asked for, already known to be this person's to ask for. */
  subject: Subject;
  /** The revision in `If-Match`, or null where none was sent. */
  ifMatch: number | null;
  request: NextRequest;
  /** Adds a line to the log of who did what, in the same transaction. */
  audit: (line: AuditLine) => Promise<void>;
  /** Runs after the commit, and only then. */
  after: (effect: () => void | Promise<void>) => void;
};

export type Spec<
  As extends Anyone['as'] = Anyone['as'],
  P = unknown,
  Q = unknown,
  B = unknown,
  S = unknown,
> = {
  /** The least role that may ask; `all` needs no sign-in. */
  as: As;
  summary: string;
  params?: z.ZodType<P>;
  query?: z.ZodType<Q>;
  body?: z.ZodType<B>;
  /** The shape of the answer's JSON; the answer is parsed by it, so that nothing else gets out. */
  output?: z.ZodType;
  /** The answer's media type where it is not JSON. */
  outputType?: string;
  /** Finds what is asked for and throws NotFound or Forbidden, before the body is looked at. */
  find?: (context: Omit<Context<As, P, Q, undefined, undefined>, 'subject' | 'body'>) => Promise<S>;
  /** Throws TooMany. */
  rate?: (request: NextRequest) => Promise<void>;
  /** `none` where a change opens its own, because it waits for something else than the database. */
  transaction?: 'none';
};

export type Answer = { status: number; data: unknown; headers: Record<string, string> } | Response;

export type Handler = ((request: NextRequest, context: { params: Promise<unknown> }) => Promise<Response>) & {
  spec?: Spec;
};

/** An answer in JSON; a revision becomes its ETag. */
export function json(
  data: unknown,
  {
    status = 200,
    etag,
    headers = {},
  }: { status?: number; etag?: number; headers?: Record<string, string> } = {},
): Answer {
  return { status, data, headers: etag === undefined ? headers : { ...headers, etag: `"${etag}"` } };
}

export const nothing: Answer = { status: 204, data: undefined, headers: {} };

/**
 * Wraps a use case, always in this order: origin, ids, session, rate, who may, body, transaction, use case, answer
 * parsed, audit, effects after the commit. Refusals become problem documents; anything else a plain 500.
 */
export function handler<As extends Anyone['as'], P = undefined, Q = undefined, B = undefined, S = undefined>(
  spec: Spec<As, P, Q, B, S>,
  act: (context: Context<As, P, Q, B, S>) => Promise<Answer>,
): Handler {
  const run: Handler = async (request, { params }) => {
    const requestId = request.headers.get('x-request-id') ?? crypto.randomUUID();
    const started = performance.now();
    let actor: Actor | null = null;
    let answer: Response;
    const changing = request.method !== 'GET' && request.method !== 'HEAD';
    const effects: (() => void | Promise<void>)[] = [];
    try {
      if (changing && !isOwnOrigin(request.headers.get('origin'))) {
        throw new Forbidden('This change was asked for by another site.');
      }
      const ids = spec.params ? readParams(spec.params, await params) : (undefined as P);
      actor = await currentActor();
      if (spec.as !== 'all') requireRole(actor, spec.as as Role);
      await spec.rate?.(request);
      const bytes = spec.body ? await readBytes(request) : null;

      const work = async (db: Db): Promise<Answer> => {
        const query = spec.query ? readQuery(spec.query, request.nextUrl.searchParams) : (undefined as Q);
        const context = {
          db,
          actor: actor as Context<As, P, Q, B, S>['actor'],
          params: ids,
          query,
          ifMatch: readIfMatch(request.headers.get('if-match')),
          request,
          audit: (line: AuditLine) => writeAudit(db, actor?.id ?? null, requestId, line),
          after: (effect: () => void | Promise<void>) => void effects.push(effect),
        };
        const subject = spec.find ? await spec.find(context) : (undefined as S);
        const body = spec.body
          ? parseBody(spec.body, request.headers.get('content-type'), bytes)
          : (undefined as B);
        return act({ ...context, subject, body });
      };
      const inTransaction = changing && spec.transaction !== 'none';
      const done = inTransaction
        ? await againAfterDeadlock(() => {
            effects.length = 0;
            return database().transaction(work);
          })
        : await work(database());
      answer = present(spec, done);
      for (const effect of effects) await effect();
    } catch (error) {
      answer = failed(error, requestId);
    }
    answer.headers.set('x-request-id', requestId);
    log.info(
      {
        requestId,
        method: request.method,
        path: request.nextUrl.pathname,
        status: answer.status,
        ms: Math.round(performance.now() - started),
        person: actor?.id,
      },
      'request',
    );
    return answer;
  };
  run.spec = spec as unknown as Spec;
  return run;
}

/** All methods of one address: what is not given is answered 405 in words. */
export function route(handlers: Partial<Record<Method, Handler>>): Record<Method, Handler> {
  const given = { ...handlers };
  if (given.GET) given.HEAD ??= given.GET;
  const allow = METHODS.filter((method) => given[method]).join(', ');
  const refuse: Handler = async (request) =>
    problem(
      {
        title: 'No such method here',
        status: 405,
        detail: `${request.method} is not offered here; ${allow} is.`,
      },
      { allow },
    );
  return Object.fromEntries(METHODS.map((method) => [method, given[method] ?? refuse])) as Record<
    Method,
    Handler
  >;
}

function requireRole(actor: Actor | null, role: Role): void {
  if (!actor) throw new NotSignedIn();
  if (ranks(actor.role) < ranks(role)) throw new Forbidden(`Only a ${role} may do this.`);
}

function readParams<P>(schema: z.ZodType<P>, value: unknown): P {
  const result = schema.safeParse(value);
  if (result.success) return result.data;
  const first = fieldErrors(result.error)[0];
  throw new Malformed(`In the address, ${first?.path} ${first?.message}.`);
}

/** Repeated names become lists; what is left out stays out. */
function readQuery<Q>(schema: z.ZodType<Q>, search: URLSearchParams): Q {
  const value: Record<string, string | string[]> = {};
  for (const name of new Set(search.keys())) {
    const all = search.getAll(name);
    value[name] = all.length > 1 ? all : (all[0] ?? '');
  }
  return parsed(schema, value);
}

function readIfMatch(header: string | null): number | null {
  if (header === null) return null;
  const match = /^(?:W\/)?"?(\d{1,15})"?$/.exec(header.trim());
  if (!match) throw new Malformed('If-Match must hold one revision, such as "3".');
  return Number(match[1]);
}

function present(spec: { output?: z.ZodType }, answer: Answer): Response {
  if (answer instanceof Response) return answer;
  const headers = { 'cache-control': 'no-store', ...answer.headers };
  if (answer.data === undefined) return new Response(null, { status: answer.status, headers });
  const data = spec.output && answer.status < 300 ? spec.output.parse(answer.data) : answer.data;
  return new Response(JSON.stringify(data), {
    status: answer.status,
    headers: { 'content-type': 'application/json; charset=utf-8', ...headers },
  });
}

const AWAY = new Set(['ECONNREFUSED', 'ECONNRESET', 'PROTOCOL_CONNECTION_LOST', 'ETIMEDOUT', 'ENOTFOUND']);
const TOOK_TOO_LONG = 1969;
const DEADLOCK = 1213;
const LOCK_WAITS = new Set([1205, DEADLOCK]);
const ATTEMPTS = 3;

/** Of requests that wait for each other the database lets one go, undone as a whole; that one just goes again. */
async function againAfterDeadlock<Result>(attempt: () => Promise<Result>): Promise<Result> {
  for (let left = ATTEMPTS - 1; ; left -= 1) {
    try {
      return await attempt();
    } catch (error) {
      if (left === 0 || (error as { errno?: number }).errno !== DEADLOCK) throw error;
    }
  }
}

function failed(error: unknown, requestId: string): Response {
  if (error instanceof Refusal) return refused(error);
  const { code, errno, name } = error as { code?: string; errno?: number; name?: string };
  if (
    (code && AWAY.has(code)) ||
    name === 'KnexTimeoutError' ||
    (errno && LOCK_WAITS.has(errno)) ||
    errno === TOOK_TOO_LONG
  ) {
    log.warn({ requestId, code, errno }, 'database away or slow');
    return refused(
      new Unavailable('The records cannot be reached just now. Nothing was changed; try again in a moment.'),
    );
  }
  log.error({ requestId, err: error }, 'request failed');
  return problem({
    title: 'Something broke here',
    status: 500,
    detail: `This is our fault, and nothing was changed. Try again; if it stays, tell whoever runs this the number ${requestId}.`,
  });
}
