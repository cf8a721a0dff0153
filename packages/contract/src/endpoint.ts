/** What one endpoint promises. The server parses by it, the client calls by it, the OpenAPI document is generated from it. */
import type { z } from 'zod';
import type { ProblemCode } from './problems.ts';

export type Method = 'GET' | 'POST' | 'PUT' | 'DELETE';

/** `json`: the response schema. `file`: bytes sent as an attachment of `contentType`. */
export interface Endpoint<
  Params extends z.ZodType = z.ZodType,
  Query extends z.ZodType = z.ZodType,
  Body extends z.ZodType = z.ZodType,
  Response extends z.ZodType = z.ZodType,
> {
  readonly method: Method;
  /** Express notation, beginning with `/api/`. */
  readonly path: `/api/${string}`;
  readonly summary: string;
  readonly params?: Params;
  readonly query?: Query;
  readonly body?: Body;
  /** Largest JSON body in bytes, where the usual 200 kB are too few. */
  readonly largestBody?: number;
  /** The request body is a file, sent as raw bytes of this type, and `body` is absent. */
  readonly upload?: { readonly contentType: string };
  readonly response: Response;
  /** The answer is a file of this type and `response` describes nothing. */
  readonly download?: { readonly contentType: string };
  readonly status?: 200 | 201 | 202;
  /** Refusals a caller must expect beside those every endpoint has (see `commonProblems`). */
  readonly problems: readonly ProblemCode[];
}

export function endpoint<
  Params extends z.ZodType = z.ZodUndefined,
  Query extends z.ZodType = z.ZodUndefined,
  Body extends z.ZodType = z.ZodUndefined,
  Response extends z.ZodType = z.ZodUndefined,
>(definition: Endpoint<Params, Query, Body, Response>): Endpoint<Params, Query, Body, Response> {
  return definition;
}

/** An empty strict object would forbid every other part of the input. */
type Filled<T> = T extends Record<string, never> ? unknown : T;

type Part<Schema> = Schema extends z.ZodUndefined ? unknown : Schema extends z.ZodType ? Filled<z.output<Schema>> : unknown;

/** All that a use case receives: params, query and body merged into one flat object. Names never collide (tested). */
export type InputOf<E> = E extends Endpoint<infer P, infer Q, infer B, z.ZodType> ? Part<P> & Part<Q> & Part<B> : never;

type WrittenPart<Schema> = Schema extends z.ZodUndefined ? unknown : Schema extends z.ZodType ? Filled<z.input<Schema>> : unknown;

/** The same as a caller writes it: defaults may be left out. */
export type CallOf<E> = E extends Endpoint<infer P, infer Q, infer B, z.ZodType> ? WrittenPart<P> & WrittenPart<Q> & WrittenPart<B> : never;

export type ResponseOf<E> = E extends Endpoint<z.ZodType, z.ZodType, z.ZodType, infer R> ? z.output<R> : never;
