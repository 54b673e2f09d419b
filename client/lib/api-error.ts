import type { ErrorCode } from '#shared/domain/error-codes.ts';
import type { Problem } from '#shared/contracts/problem.ts';

/** What went wrong on the way, beside the codes the server answers with. */
export type ClientErrorCode = ErrorCode | 'network' | 'unreadable-answer';

interface ApiErrorParts {
  status: number;
  code: ClientErrorCode;
  title: string;
  detail: string;
  errors?: Problem['errors'];
  requestId?: string | null;
  context?: Problem['context'];
  retryAfterS?: number | null;
}

/** A request that did not succeed: the problem document of the answer, or why there was none (status 0). */
export class ApiError extends Error {
  readonly status: number;
  readonly code: ClientErrorCode;
  readonly title: string;
  readonly detail: string;
  /** Where in the input each fault lies. */
  readonly errors: readonly { path: string; message: string }[];
  readonly requestId: string | null;
  readonly context: Readonly<Record<string, unknown>>;
  readonly retryAfterS: number | null;

  constructor(parts: ApiErrorParts) {
    super(`${parts.title}. ${parts.detail}`);
    this.name = 'ApiError';
    this.status = parts.status;
    this.code = parts.code;
    this.title = parts.title;
    this.detail = parts.detail;
    this.errors = parts.errors ?? [];
    this.requestId = parts.requestId ?? null;
    this.context = parts.context ?? {};
    this.retryAfterS = parts.retryAfterS ?? null;
  }

  /** The message for one field of a form, by its path in the input. */
  messageAt(path: string): string | undefined {
    return this.errors.find((error) => error.path === path)?.message;
  }
}

/** Tells whether an error is an answer with this code. */
export function isApiError(error: unknown, ...codes: ClientErrorCode[]): error is ApiError {
  return error instanceof ApiError && (codes.length === 0 || codes.includes(error.code));
}
