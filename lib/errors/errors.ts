export type FieldError = { path: string; message: string };

/** A refusal that a person can do something about; `handler()` turns it into its status. */
export abstract class Refusal extends Error {
  abstract readonly status: number;
  abstract readonly title: string;
  /** Extra members of the problem document. */
  readonly extra: Record<string, unknown> = {};
  readonly headers: Record<string, string> = {};
}

export class Malformed extends Refusal {
  readonly status = 400;
  readonly title = 'This request cannot be read';
}

export class NotSignedIn extends Refusal {
  readonly status = 401;
  readonly title = 'Sign in first';
  constructor(detail = 'This needs somebody who is signed in. Sign in and send it again.') {
    super(detail);
  }
}

export class Forbidden extends Refusal {
  readonly status = 403;
  readonly title = 'Not yours to do';
}

/** Absent, or not yours to know of: the two look alike. */
export class NotFound extends Refusal {
  readonly status = 404;
  readonly title = 'Nothing here';
  constructor(detail = 'There is nothing at this address, or it is not public.') {
    super(detail);
  }
}

export class Conflict extends Refusal {
  readonly status = 409;
  readonly title = 'This does not fit what is stored';
}

/**
 * Somebody, perhaps you on another device, saved in between. Nothing was overwritten. `revision` is the one that stands
 * now, null where the thing was removed.
 */
export class Stale extends Refusal {
  readonly status = 412;
  readonly title = 'Changed in between';
  override readonly extra: Record<string, unknown>;
  override readonly headers: Record<string, string>;
  constructor(revision: number | null) {
    super(
      revision === null
        ? 'This was removed in between; nothing stands at this address now.'
        : `This was saved in between; it now stands at revision ${revision}. Read it again and decide.`,
    );
    this.extra = { revision };
    this.headers = revision === null ? {} : { etag: `"${revision}"` };
  }
}

export class TooLarge extends Refusal {
  readonly status = 413;
  readonly title = 'Too large';
}

export class WrongType extends Refusal {
  readonly status = 415;
  readonly title = 'Wrong content type';
}

/** Understood, but not valid; `errors` says where. */
export class Invalid extends Refusal {
  readonly status = 422;
  readonly title = 'Some of this needs another look';
  override readonly extra: Record<string, unknown>;
  readonly errors: FieldError[];
  constructor(errors: FieldError[]) {
    super(
      errors.map((error) => (error.path ? `${error.path}: ${error.message}` : error.message)).join(' · '),
    );
    this.errors = errors;
    this.extra = { errors };
  }
}

export class ConditionRequired extends Refusal {
  readonly status = 428;
  readonly title = 'Say which revision you changed';
  constructor() {
    super('Send If-Match with the revision (ETag) that you read, so that nothing is overwritten unseen.');
  }
}

export class TooMany extends Refusal {
  readonly status = 429;
  readonly title = 'Too many tries';
  override readonly headers: Record<string, string>;
  constructor(retryAfterSeconds: number) {
    super(`Too many tries. Wait ${Math.ceil(retryAfterSeconds / 60)} minutes and try again.`);
    this.headers = { 'retry-after': String(Math.max(1, Math.ceil(retryAfterSeconds))) };
  }
}

export class Unavailable extends Refusal {
  readonly status = 503;
  readonly title = 'Not just now';
  override readonly headers: Record<string, string> = { 'retry-after': '5' };
}
