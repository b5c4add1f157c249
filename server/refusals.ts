import type { Problem } from '#shared/api/problem.ts';

type Conflicts = NonNullable<Problem['conflicts']>;

/** What a request can end in but its answer. Each is one code of the contract and one status. */
export abstract class Refusal extends Error {
  abstract readonly code: Problem['code'];
  abstract readonly status: number;
  abstract readonly title: string;
}

export class Invalid extends Refusal {
  readonly code = 'invalid';
  readonly title: string = 'That can not be done as it was sent';
  readonly status: number;
  readonly field: string | undefined;
  constructor(detail: string, field?: string, status = 400) {
    super(detail);
    this.field = field;
    this.status = status;
  }
}

export class NotSignedIn extends Refusal {
  readonly code = 'not-signed-in';
  readonly status = 401;
  readonly title = 'Not signed in';
  constructor(detail = 'Sign in to go on.') {
    super(detail);
  }
}

export class Forbidden extends Refusal {
  readonly code = 'forbidden';
  readonly status = 403;
  readonly title = 'Not allowed';
}

/** Also for what is there and may not be seen: the two must read alike. */
export class NotFound extends Refusal {
  readonly code = 'not-found';
  readonly status = 404;
  readonly title = 'Not found';
  constructor(detail = 'There is nothing here, or it is not yours to see.') {
    super(detail);
  }
}

export class Conflict extends Refusal {
  readonly code = 'conflict';
  readonly status = 409;
  readonly title = 'Changed meanwhile';
  readonly conflicts: Conflicts | undefined;
  readonly seq: number | undefined;
  constructor(detail: string, now: { readonly conflicts?: Conflicts; readonly seq?: number } = {}) {
    super(detail);
    this.conflicts = now.conflicts;
    this.seq = now.seq;
  }
}

export class TooManyRequests extends Refusal {
  readonly code = 'too-many-requests';
  readonly status = 429;
  readonly title = 'Too many requests';
  constructor(detail = 'That was asked too often. Wait a little and try again.') {
    super(detail);
  }
}

export class Unavailable extends Refusal {
  readonly code = 'unavailable';
  readonly status = 503;
  readonly title = 'Not available just now';
}
