import type { EntryContent, EntryView } from '@/lib/entries/schema';
import type { FieldError } from '@/lib/errors/errors';

/** How a request went, as far as the editor has to act on it. */
export type Outcome =
  | { readonly kind: 'done'; readonly view: EntryView; readonly revision: number }
  | { readonly kind: 'stale' }
  | { readonly kind: 'signed-out' }
  | { readonly kind: 'gone' }
  | { readonly kind: 'invalid'; readonly errors: readonly FieldError[]; readonly detail: string }
  | { readonly kind: 'refused'; readonly detail: string }
  /** No answer, or not now: worth another try, after so many milliseconds where the server said so. */
  | { readonly kind: 'later'; readonly afterMs: number | null };

export interface Transport {
  put(id: string, content: EntryContent, revision: number | null, keepalive: boolean): Promise<Outcome>;
  get(id: string): Promise<Outcome>;
  submit(id: string): Promise<Outcome>;
}

/** A request that may outlive its page carries 64 kB at most (Fetch standard, keepalive); some is left for its headers. */
const MOST_KEEPALIVE_BYTES = 60_000;
/** A request that hangs is a lost signal; the same body is sent again. */
const PATIENCE_MS = 30_000;

export function transport(fetcher: typeof fetch): Transport {
  const ask = async (path: string, init: RequestInit): Promise<Outcome> => {
    try {
      return await outcomeOf(await fetcher(path, { ...init, signal: AbortSignal.timeout(PATIENCE_MS) }));
    } catch {
      return { kind: 'later', afterMs: null };
    }
  };
  const address = (id: string) => `/api/entries/${id}`;
  return {
    put(id, content, revision, keepalive) {
      const body = JSON.stringify(content);
      const small = new TextEncoder().encode(body).length <= MOST_KEEPALIVE_BYTES;
      return ask(address(id), {
        method: 'PUT',
        headers: {
          'content-type': 'application/json',
          ...(revision === null ? {} : { 'if-match': `"${revision}"` }),
        },
        body,
        keepalive: keepalive && small,
      });
    },
    get: (id) => ask(address(id), { headers: { accept: 'application/json' } }),
    submit: (id) => ask(`${address(id)}/submit`, { method: 'POST' }),
  };
}

async function outcomeOf(response: Response): Promise<Outcome> {
  const { status } = response;
  if (response.ok) {
    const view = (await response.json()) as EntryView;
    return { kind: 'done', view, revision: revisionOf(response) ?? view.revision };
  }
  if (status === 401) return { kind: 'signed-out' };
  if (status === 404) return { kind: 'gone' };
  if (status === 412 || status === 428) return { kind: 'stale' };
  if (status === 429 || status >= 500) return { kind: 'later', afterMs: retryAfterMs(response) };
  const { errors, detail } = await problemOf(response);
  if (status === 422 || status === 413 || status === 400) return { kind: 'invalid', errors, detail };
  return { kind: 'refused', detail };
}

function revisionOf(response: Response): number | null {
  const tag = /^(?:W\/)?"(\d+)"$/.exec(response.headers.get('etag') ?? '');
  return tag ? Number(tag[1]) : null;
}

function retryAfterMs(response: Response): number | null {
  const seconds = Number(response.headers.get('retry-after') ?? Number.NaN);
  return Number.isFinite(seconds) && seconds > 0 ? seconds * 1000 : null;
}

async function problemOf(response: Response): Promise<{ errors: FieldError[]; detail: string }> {
  try {
    const body = (await response.json()) as { errors?: FieldError[]; detail?: string; title?: string };
    return { errors: body.errors ?? [], detail: body.detail ?? body.title ?? 'The server refused this.' };
  } catch {
    return { errors: [], detail: 'The server refused this.' };
  }
}
