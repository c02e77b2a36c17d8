import type { Problem, ProblemType } from '#contract';

export interface FieldError {
  readonly field: string;
  readonly message: string;
}

interface More {
  readonly detail?: string | undefined;
  readonly errors?: readonly FieldError[] | undefined;
  readonly current?: unknown;
}

/** Something that the one who asked can understand and act on: becomes an RFC 9457 problem document. */
export class ProblemError extends Error {
  constructor(readonly status: number, readonly type: ProblemType, title: string, readonly more: More = {}) {
    super(title);
  }

  toDocument(): Problem {
    const { detail, errors, current } = this.more;
    return {
      type: `https://lanewright.example/problems/${this.type}`,
      title: this.message,
      status: this.status,
      ...(detail === undefined ? {} : { detail }),
      ...(errors === undefined ? {} : { errors: [...errors] }),
      ...(current === undefined ? {} : { current }),
    };
  }
}

/** 400: the request itself cannot be understood. */
export class BadRequest extends ProblemError {
  constructor(title: string, detail?: string) {
    super(400, 'bad-request', title, { detail });
  }
}

/** 422: understood, but a value is not possible. `errors` names the fields. */
export class Invalid extends ProblemError {
  constructor(errors: readonly FieldError[], title = 'Some values are not possible') {
    super(422, 'invalid-input', title, { errors });
  }
}

/** 401 */
export class NotSignedIn extends ProblemError {
  constructor() {
    super(401, 'not-signed-in', 'You are not signed in', { detail: 'Sign in, then try again.' });
  }
}

/** 401, the same whether the e-mail address or the password is wrong. */
export class SignInFailed extends ProblemError {
  constructor() {
    super(401, 'sign-in-failed', 'E-mail address or password is wrong', { detail: 'Check both and try again.' });
  }
}

/** 403 */
export class NotAllowed extends ProblemError {
  constructor(detail = 'Your role does not include this. Ask your administrator if you need it.') {
    super(403, 'not-allowed', 'You may not do this', { detail });
  }
}

/** 404, also for what belongs to somebody else. */
export class NotFound extends ProblemError {
  constructor(what: string) {
    super(404, 'not-found', `This ${what} does not exist`, { detail: 'It may have been deleted, or the address is wrong.' });
  }
}

/** 412 with the row as it is now (null: deleted). */
export class StaleWrite extends ProblemError {
  constructor(current: unknown) {
    super(412, 'stale-write', 'Somebody else changed this meanwhile', { current, detail: 'Look at the new values, then repeat your change.' });
  }
}

/** 428 */
export class VersionMissing extends ProblemError {
  constructor() {
    super(428, 'version-missing', 'The version you read is missing', { detail: 'Send it as If-Match, for instance If-Match: "3".' });
  }
}

/** 409: contradicts what is there. */
export class Conflict extends ProblemError {
  constructor(title: string, errors?: readonly FieldError[]) {
    super(409, 'conflict', title, { errors });
  }
}

/** 409: a deletion of what others still refer to. */
export class StillUsed extends ProblemError {
  constructor(title: string, detail?: string) {
    super(409, 'still-used', title, { detail });
  }
}

/** 413 */
export class TooLarge extends ProblemError {
  constructor(title: string, detail?: string) {
    super(413, 'too-large', title, { detail });
  }
}
