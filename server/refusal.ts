import type * as z from 'zod';
import { errorStatus, errorTitle, type ErrorCode } from '#shared/domain/error-codes.ts';

export interface RefusalDetails {
  errors?: { path: string; message: string }[];
  /** What the caller needs to go on, such as the current version or who holds a claim. */
  context?: Record<string, unknown>;
  retryAfterS?: number;
}

/** Thrown by services when something is refused; becomes a problem document at the edge and nothing in between catches it. */
export class Refusal extends Error {
  readonly code: ErrorCode;
  readonly status: number;
  readonly details: RefusalDetails;

  constructor(code: ErrorCode, detail: string = errorTitle[code], details: RefusalDetails = {}) {
    super(detail);
    this.name = 'Refusal';
    this.code = code;
    this.status = errorStatus[code];
    this.details = details;
  }
}

/** The refusal for what does not exist or may not be known to exist. */
export const notFound = (what: string) => new Refusal('not-found', `${what} was not found.`);

/** A zod error as a refusal that says where each fault lies. */
export function refusalFromZod(error: z.ZodError): Refusal {
  const errors = error.issues.map((issue) => ({ path: issue.path.join('.'), message: issue.message }));
  const first = errors[0];
  return new Refusal('invalid-input', first ? `${first.path || 'input'}: ${first.message}` : undefined, { errors });
}
