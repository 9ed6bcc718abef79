import type { z } from 'zod';
import { getDatabase } from '@/db/client';
import { findActor } from '@/lib/auth/actor';
import type { Context } from '@/lib/context';
import { SYSTEM, type PersonActor } from '@/lib/domain/access';
import { Refusal } from '@/lib/errors';
import { parseWith, readJson } from './body';
import { checkSameSite } from './same-site';
import { problemResponse } from './problem';

type PersonContext = Context & { actor: PersonActor };
type Parsed<T> = T extends z.ZodType ? z.output<T> : undefined;
type Spec<P, Q, B> = { params?: P; query?: Q; body?: B; status?: number };
type Input<P, Q, B> = { params: Parsed<P>; query: Parsed<Q>; body: Parsed<B>; request: Request };
type Route = { params: Promise<Record<string, string | string[]>> };
type Run = (request: Request, route: Route) => Promise<unknown>;
/** What a verb was declared with, for whoever compares routes with the API's description. */
type Declared = {
  spec: Spec<z.ZodType | undefined, z.ZodType | undefined, z.ZodType | undefined>;
  open: boolean;
};
export type Handler = ((request: Request, route: Route) => Promise<Response>) & Declared;

/**
 * One verb of a route: who asks, is what was sent right, call, answer. `run` returns what is sent as JSON with
 * `status` (200 unless given), or a Response of its own. Signed-in people only; a refusal becomes problem+json.
 */
export function handle<
  P extends z.ZodType | undefined = undefined,
  Q extends z.ZodType | undefined = undefined,
  B extends z.ZodType | undefined = undefined,
>(spec: Spec<P, Q, B>, run: (ctx: PersonContext, input: Input<P, Q, B>) => Promise<unknown>): Handler {
  return answering({ spec, open: false }, async (request, route) => {
    const actor = await findActor(getDatabase(), request.headers);
    if (!actor) throw new Refusal('not_signed_in', 'Sign in, or send a valid API key.');
    if (actor.sessionId !== null) checkSameSite(request);
    return run({ db: getDatabase(), actor, now: new Date() }, await parseInput(spec, request, route));
  });
}

/** As `handle`, for the few routes that anybody may call. The actor is the system: such an action checks its own token. */
export function handlePublic<
  P extends z.ZodType | undefined = undefined,
  Q extends z.ZodType | undefined = undefined,
  B extends z.ZodType | undefined = undefined,
>(spec: Spec<P, Q, B>, run: (ctx: Context, input: Input<P, Q, B>) => Promise<unknown>): Handler {
  return answering({ spec, open: true }, async (request, route) =>
    run({ db: getDatabase(), actor: SYSTEM, now: new Date() }, await parseInput(spec, request, route)),
  );
}

function answering(declared: Declared, run: Run): Handler {
  const handler = async (request: Request, route: Route) => {
    try {
      const answer = await run(request, route);
      if (answer instanceof Response) return answer;
      return Response.json(answer ?? null, {
        status: declared.spec.status ?? 200,
        headers: { 'cache-control': 'no-store' },
      });
    } catch (error) {
      if (!(error instanceof Refusal)) console.error(error);
      return problemResponse(error);
    }
  };
  return Object.assign(handler, declared);
}

async function parseInput<P, Q, B>(
  spec: Spec<P, Q, B>,
  request: Request,
  route: Route,
): Promise<Input<P, Q, B>> {
  const { params, query, body } = spec as Spec<z.ZodType, z.ZodType, z.ZodType>;
  const search = query ? Object.fromEntries(new URL(request.url).searchParams) : undefined;
  return {
    params: params ? parseWith(params, await route.params) : undefined,
    query: query ? parseWith(query, search) : undefined,
    body: body ? parseWith(body, await readJson(request)) : undefined,
    request,
  } as Input<P, Q, B>;
}
