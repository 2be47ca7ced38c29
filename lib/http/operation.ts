/** One verb on one route: what it asks, what it answers and who may. Handlers and the OpenAPI document are made from it. */
import type { z } from "zod";
import type { Permission } from "@/lib/auth/permission";
import type { ErrorCode } from "@/lib/http/errors";

export type Method = "GET" | "POST" | "PUT" | "PATCH" | "DELETE";

export interface Operation<
  Path extends string = string,
  Query extends z.ZodType = z.ZodType,
  Body extends z.ZodType = z.ZodType,
> {
  /** unique name of the operation */
  id: string;
  method: Method;
  /** under /api/v1, its parameters in braces: /cables/{cableId} */
  path: Path;
  summary: string;
  /** null: no sign-in needed */
  permission: Permission | null;
  query?: Query;
  body?: Body;
  /** most bytes of a body; default 1 MB */
  mostBodyBytes?: number;
  /** a body that the route reads by itself, by media type: a file; what is not JSON is text or a form */
  accepts?: Record<string, z.ZodType>;
  answer: {
    status: 200 | 201 | 204;
    description: string;
    schema?: z.ZodType;
    /** other than JSON; of several the first has the schema */
    mediaType?: string | readonly string[];
    hasEntityTag?: true;
  };
  /** whether If-Match is needed */
  needsMatch?: true;
  /** refusals beyond those that follow from the rest */
  refusals?: ErrorCode[];
}

/** Names of the parameters in a path. */
export type ParameterNames<Path extends string> = Path extends `${string}{${infer Name}}${infer Rest}`
  ? Name | ParameterNames<Rest>
  : never;

/** Declares an operation, keeping the types of its path, query and body. */
export function operation<
  const Path extends string,
  Query extends z.ZodType = z.ZodUndefined,
  Body extends z.ZodType = z.ZodUndefined,
>(declared: Operation<Path, Query, Body>): Operation<Path, Query, Body> {
  return declared;
}
