import type { Request, Response } from 'express';
import type { z } from 'zod';
import type { Context, PublicContext } from './context';

export type Method = 'get' | 'post' | 'put' | 'patch' | 'delete';
export type Access = 'public' | 'signed-in' | 'admin';

type Shape = z.ZodObject | undefined;
type Parsed<T> = T extends z.ZodType ? z.output<T> : undefined;

export interface EndpointInput<P extends Shape, Q extends Shape, B extends z.ZodType | undefined> {
  readonly params: Parsed<P>;
  readonly query: Parsed<Q>;
  readonly body: Parsed<B>;
  /** the row version of If-Match; present where `versioned` is set */
  readonly version: number;
}

/** The raw exchange, for the few endpoints that set cookies, stream, or take a file. */
export interface Exchange {
  readonly request: Request;
  readonly response: Response;
}

/** An answer with a status other than the first one listed. */
export class Reply<T> {
  constructor(
    readonly status: number,
    readonly body: T,
  ) {}
}

interface Answers {
  readonly [status: number]: z.ZodType | null;
}

interface Definition<P extends Shape, Q extends Shape, B extends z.ZodType | undefined, A extends Access> {
  readonly method: Method;
  /** below /api/v1, with :params */
  readonly path: string;
  readonly summary: string;
  readonly tag: string;
  readonly access: A;
  readonly params?: P;
  readonly query?: Q;
  readonly body?: B;
  /** takes one file in the multipart field `file`; text fields are parsed by `body` */
  readonly upload?: true;
  /** needs If-Match with the row's version */
  readonly versioned?: true;
  /** streams server-sent events; the handler answers by itself */
  readonly stream?: true;
  /** answers by status, the usual one first; null = no content */
  readonly answers: Answers;
  readonly handle: (
    context: A extends 'public' ? PublicContext : Context,
    input: EndpointInput<P, Q, B>,
    exchange: Exchange,
  ) => unknown;
}

/** An endpoint as the router, the API page and the access-matrix test see it. */
export interface Endpoint extends Omit<Definition<Shape, Shape, z.ZodType | undefined, Access>, 'handle'> {
  readonly handle: (context: Context, input: never, exchange: Exchange) => unknown;
}

/** Declares one endpoint; types of its parts follow from its schemas. */
export function endpoint<
  A extends Access,
  P extends Shape = undefined,
  Q extends Shape = undefined,
  B extends z.ZodType | undefined = undefined,
>(definition: Definition<P, Q, B, A>): Endpoint {
  return definition as unknown as Endpoint;
}
