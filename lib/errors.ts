/** An error whose words are written for the person in front of the screen. Everything else is a bug and stays unnamed. */
export class AppError extends Error {
  // Bundlers shorten class names, so the name is written out.
  override name = "AppError";
  readonly status: number = 400;
  constructor(readonly publicMessage: string) {
    super(publicMessage);
  }
}

/** Also thrown for a row of another employer: an id that may not be seen looks like no id at all. */
export class NotFoundError extends AppError {
  override name = "NotFoundError";
  override readonly status = 404;
  constructor(what: string) {
    super(`There is no such ${what}.`);
  }
}

export class ForbiddenError extends AppError {
  override name = "ForbiddenError";
  override readonly status = 403;
}

/** The act was allowed, but the record is no longer in the state it needs. */
export class ConflictError extends AppError {
  override name = "ConflictError";
  override readonly status = 409;
}

export class InvalidError extends AppError {
  override name = "InvalidError";
  override readonly status = 422;
  constructor(
    publicMessage: string,
    readonly fields: Readonly<Record<string, string[]>> = {},
  ) {
    super(publicMessage);
  }
}

/** Thrown where the act needs the password again within the last five minutes. */
export class SignInAfreshError extends ForbiddenError {
  override name = "SignInAfreshError";
  constructor() {
    super("Sign in afresh to sign this: enter your password again.");
  }
}

/** Asked too often; the same request is welcome after the wait. */
export class ThrottledError extends AppError {
  override name = "ThrottledError";
  override readonly status = 429;
  constructor(readonly waitSeconds: number) {
    super(
      `Too many tries. Wait ${waitSeconds < 60 ? `${waitSeconds} s` : `${Math.ceil(waitSeconds / 60)} min`}, then try again.`,
    );
  }
}
