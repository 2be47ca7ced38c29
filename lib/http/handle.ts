import "server-only";
import type { z } from "zod";
import { type Actor, requestActor } from "@/lib/auth/actor";
import { requirePermission } from "@/lib/auth/permission";
import { readJson } from "@/lib/http/body";
import { AppError, problem, problemOf } from "@/lib/http/errors";
import type { Method, Operation, ParameterNames } from "@/lib/http/operation";
import { refuseCrossSite, refuseOtherPerson } from "@/lib/http/origin";
import { parse } from "@/lib/http/parse";

type Context = { params: Promise<Record<string, string | string[] | undefined>> };

/** A route handler; one made from an operation carries it, so that the description can be held against it. */
export interface Handler {
  (request: Request, context: Context): Promise<Response>;
  operation?: Operation;
}

/** What an operation's code is given. */
export interface Asked<Path extends string, Query extends z.ZodType, Body extends z.ZodType> {
  request: Request;
  params: Record<ParameterNames<Path>, string>;
  query: z.output<Query>;
  /** Reads and checks the body; a function, so that who may and which version is decided first. */
  body: () => Promise<z.output<Body>>;
}

type Answer = Response | Promise<Response>;

/** A query string as an object: a field given once is text, given more often a list of texts. */
function queryObject(search: URLSearchParams): Record<string, string | string[]> {
  const entries = [...new Set(search.keys())].map((key): [string, string | string[]] => {
    const values = search.getAll(key);
    return [key, values.length === 1 ? (values[0] ?? "") : values];
  });
  return Object.fromEntries(entries);
}

async function read<Path extends string, Query extends z.ZodType, Body extends z.ZodType>(
  declared: Operation<Path, Query, Body>,
  request: Request,
  context: Context,
): Promise<Asked<Path, Query, Body>> {
  const given = queryObject(new URL(request.url).searchParams);
  return {
    request,
    params: (await context.params) as Record<ParameterNames<Path>, string>,
    query: declared.query ? parse(declared.query, given) : (undefined as z.output<Query>),
    body: () => {
      if (!declared.body) throw new Error(`handle: ${declared.id} declares no body`);
      return readJson(request, declared.body, declared.mostBodyBytes);
    },
  };
}

function carrying(declared: unknown, handler: Handler): Handler {
  handler.operation = declared as Operation;
  return handler;
}

/**
 * A handler for whoever is signed in and has the operation's permission. In order: who asks (401), whether from our own
 * page (403), whether they may (403), the query (422); then the operation's own code. Refusals become problem documents.
 */
export function handle<Path extends string, Query extends z.ZodType, Body extends z.ZodType>(
  declared: Operation<Path, Query, Body>,
  answer: (asked: Asked<Path, Query, Body> & { actor: Actor }) => Answer,
): Handler {
  const { permission } = declared;
  if (permission === null) throw new Error(`handle: ${declared.id} has no permission; use handlePublic`);
  return carrying(declared, async (request, context) => {
    try {
      const actor = await requestActor(request);
      refuseCrossSite(request);
      refuseOtherPerson(request, actor);
      requirePermission(actor, permission);
      return await answer({ ...(await read(declared, request, context)), actor });
    } catch (error) {
      return problemOf(error);
    }
  });
}

/** A handler for anyone at all. */
export function handlePublic<Path extends string, Query extends z.ZodType, Body extends z.ZodType>(
  declared: Operation<Path, Query, Body>,
  answer: (asked: Asked<Path, Query, Body>) => Answer,
): Handler {
  return carrying(declared, async (request, context) => {
    try {
      return await answer(await read(declared, request, context));
    } catch (error) {
      return problemOf(error);
    }
  });
}

const methods = ["GET", "POST", "PUT", "PATCH", "DELETE"] as const satisfies Method[];

/** All verbs of a route: those it has, 405 with `Allow` for the others. */
export function route(handlers: Partial<Record<Method, Handler>>): Record<Method | "OPTIONS", Handler> {
  const own = methods.filter((method) => handlers[method]);
  const allow = [...own, ...(handlers.GET ? ["HEAD"] : []), "OPTIONS"].join(", ");
  const refuse: Handler = async (request) =>
    problem(
      new AppError("method_not_allowed", `${request.method} is not possible here.`, {}, { headers: { Allow: allow } }),
    );
  const options: Handler = async () => new Response(null, { status: 204, headers: { Allow: allow } });
  const all = methods.map((method): [Method, Handler] => [method, handlers[method] ?? refuse]);
  return { ...(Object.fromEntries(all) as Record<Method, Handler>), OPTIONS: options };
}

/** All verbs of a path nothing stands at. */
export function nothingHere(): Record<Method | "OPTIONS", Handler> {
  const refuse: Handler = async () => problem(new AppError("not_found", "There is nothing at this address."));
  return { GET: refuse, POST: refuse, PUT: refuse, PATCH: refuse, DELETE: refuse, OPTIONS: refuse };
}
