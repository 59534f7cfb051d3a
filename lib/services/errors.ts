/** An expected refusal: its message is written for the person on the other side. Everything else is a bug. */
export abstract class Refusal extends Error {
  abstract readonly code: string;
  abstract readonly status: number;
  /** More that the answer carries, such as both versions of a conflict. */
  readonly extra: Record<string, unknown>;
  constructor(message: string, extra: Record<string, unknown> = {}) {
    super(message);
    this.extra = extra;
  }
}

/** Nobody is signed in, or the session has ended. */
export class SignedOut extends Refusal {
  readonly code = "signed-out";
  readonly status = 401;
}

/** There is no such thing here, or not for this person: the two are not told apart. */
export class NotFound extends Refusal {
  readonly code = "not-found";
  readonly status = 404;
}

/** The person is a member but the role does not allow the act. */
export class Forbidden extends Refusal {
  readonly code = "forbidden";
  readonly status = 403;
}

/** The state of things does not allow the act any more: somebody was first, or an order was missed. */
export class Conflict extends Refusal {
  readonly code: string = "conflict";
  readonly status: number = 409;
}

/** The writer saw an older revision than the one that counts; both are in the answer. */
export class Superseded extends Conflict {
  override readonly code = "superseded";
  override readonly status = 412;
}

/** A write came without saying which revision it saw. */
export class RevisionMissing extends Refusal {
  readonly code = "revision-missing";
  readonly status = 428;
}

/** What was sent cannot be used; `fields` says where and why, one sentence each. */
export class Invalid extends Refusal {
  readonly code = "invalid";
  readonly status: number;
  readonly fields: Record<string, string>;
  constructor(message: string, fields: Record<string, string> = {}, status = 400) {
    super(message, { fields });
    this.fields = fields;
    this.status = status;
  }
}

/** Too many attempts: says when to come back. */
export class Throttled extends Refusal {
  readonly code = "throttled";
  readonly status = 429;
  constructor(
    message: string,
    readonly retryAfter_s: number,
  ) {
    super(message, { retryAfter_s });
  }
}

/** Something we depend on is away; nothing was written. */
export class Unavailable extends Refusal {
  readonly code = "unavailable";
  readonly status = 503;
}
