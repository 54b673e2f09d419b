import type * as z from 'zod';
import type { Role } from '../domain/roles.ts';

export type Method = 'GET' | 'POST' | 'PATCH' | 'DELETE';

/** One HTTP endpoint, declared once: the server validates by it, the client calls by it, the OpenAPI document is made from it. */
export interface Endpoint<
  Params extends z.ZodType = z.ZodType,
  Query extends z.ZodType = z.ZodType,
  Body extends z.ZodType = z.ZodType,
  Response extends z.ZodType = z.ZodType,
> {
  readonly method: Method;
  /** Path below `/api/v1`, parameters as `:name`. */
  readonly path: string;
  readonly summary: string;
  /** The weakest role that may call it at all; what it may see or do there is the policy's matter. */
  readonly access: Role;
  readonly params?: Params;
  readonly query?: Query;
  readonly body?: Body;
  /** What a successful answer holds; absent for a file or an empty answer. */
  readonly response?: Response;
  /** Writes need the form token unless they say otherwise (calculators, which change nothing). */
  readonly csrf?: boolean;
}

/** Declares an endpoint, keeping the types of its schemas. */
export function endpoint<P extends z.ZodType, Q extends z.ZodType, B extends z.ZodType, R extends z.ZodType>(
  declaration: Endpoint<P, Q, B, R>,
): Endpoint<P, Q, B, R> {
  return declaration;
}

/** The parsed parts of a request to an endpoint. */
export type ParamsOf<E> = E extends Endpoint<infer P, z.ZodType, z.ZodType, z.ZodType> ? z.output<P> : never;
export type QueryOf<E> = E extends Endpoint<z.ZodType, infer Q, z.ZodType, z.ZodType> ? z.output<Q> : never;
export type BodyOf<E> = E extends Endpoint<z.ZodType, z.ZodType, infer B, z.ZodType> ? z.output<B> : never;
export type ResponseOf<E> = E extends Endpoint<z.ZodType, z.ZodType, z.ZodType, infer R> ? z.output<R> : never;
