/** What the person is told for each refusal. One entry a code; the HTTP status goes with it. */
export const APP_ERRORS = {
  INVALID_INPUT: { status: 422, message: 'Some entries need another look' },
  MALFORMED: { status: 400, message: 'The request could not be read' },
  NOT_SIGNED_IN: { status: 401, message: 'Sign in first' },
  SIGN_IN_FAILED: { status: 401, message: 'This e-mail address and password do not go together' },
  TOO_MANY_TRIES: { status: 429, message: 'Too many tries. Wait a little, then try again' },
  NOT_FOUND: { status: 404, message: 'There is nothing here, or it is not yours to see' },
  NOT_ALLOWED: { status: 403, message: 'You may look at this, but not change it' },
  CHANGED_MEANWHILE: {
    status: 409,
    message: 'Somebody saved a newer version meanwhile; yours is kept on this page',
  },
  PRECONDITION_FAILED: {
    status: 412,
    message: 'It changed since you read it. Read it again, then send the change',
  },
  CONFLICT: { status: 409, message: 'This does not go with what is already there' },
  LINK_SPENT: {
    status: 410,
    message: 'This link has been used, has run out or was withdrawn. Ask for a new one',
  },
  TOO_LARGE: { status: 413, message: 'This is larger than the notebook takes' },
  UNREADABLE_FILE: { status: 422, message: 'This file could not be read' },
  CALCULATION_REFUSED: { status: 422, message: 'These readings do not allow the calculation' },
} as const;

export type AppErrorCode = keyof typeof APP_ERRORS;

export interface ErrorDetail {
  /** JSON pointer to the member that is wrong, or the name of a form field. */
  readonly pointer: string;
  readonly detail: string;
}

/** A refusal that a person or a script is meant to read. Anything else that is thrown is a bug. */
export class AppError extends Error {
  readonly code: AppErrorCode;
  readonly details: readonly ErrorDetail[];

  constructor(code: AppErrorCode, message?: string, details: readonly ErrorDetail[] = []) {
    super(message ?? APP_ERRORS[code].message);
    this.name = 'AppError';
    this.code = code;
    this.details = details;
  }

  get status(): number {
    return APP_ERRORS[this.code].status;
  }
}
