import * as z from 'zod';
import { errorStatus, type ErrorCode } from '../domain/error-codes.ts';

const codes = Object.keys(errorStatus) as [ErrorCode, ...ErrorCode[]];

/** An error answer: a problem document by RFC 9457, with our code, the request's id and where in the input each fault lies. */
export const problem = z.object({
  type: z.string(),
  title: z.string(),
  status: z.int(),
  detail: z.string(),
  code: z.enum(codes),
  requestId: z.string(),
  errors: z.array(z.object({ path: z.string(), message: z.string() })).optional(),
  /** What the caller needs to go on: the current version of a stale record, who holds a claim, a suggested correction. */
  context: z.record(z.string(), z.unknown()).optional(),
});
export type Problem = z.infer<typeof problem>;
