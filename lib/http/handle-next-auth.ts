import NextAuth from 'next-auth';
import { NextRequest } from 'next/server';
import { authOptions, deviceCookie, type AuthRequest } from '@/lib/auth/next-auth';
import { readText } from './body';
import { clientAddress } from './client-address';
import { problemOf, problemResponse } from './problem';

type Route = { params: Promise<{ nextauth: string[] }> };

/**
 * next-auth's routes under `/api/auth`, with a limit on the body, the known-device cookie after a good sign-in, and
 * a refusal told as elsewhere: status, `Retry-After`, and the fields of a problem beside next-auth's own `url`.
 */
export async function handleNextAuth(request: NextRequest, route: Route): Promise<Response> {
  try {
    const asked: AuthRequest = { headers: request.headers, address: clientAddress(request.headers) };
    const bounded = request.method === 'POST' ? await readWhole(request) : request;
    const answer = (await NextAuth(bounded, route, authOptions(asked))) as Response;
    if (asked.refusal && answer.headers.get('content-type') === 'application/json') {
      return refusalAnswer(asked.refusal, answer);
    }
    if (asked.signedIn) answer.headers.append('set-cookie', deviceCookie(asked.signedIn));
    answer.headers.set('cache-control', 'private, no-store');
    return answer;
  } catch (error) {
    console.error(error);
    return problemResponse(error);
  }
}

async function readWhole(request: NextRequest): Promise<NextRequest> {
  const body = await readText(request);
  return new NextRequest(request.url, { method: 'POST', headers: request.headers, body });
}

async function refusalAnswer(refusal: NonNullable<AuthRequest['refusal']>, answer: Response) {
  const told = problemResponse(refusal);
  const { url } = (await answer.json()) as { url?: string };
  const headers = new Headers(told.headers);
  headers.set('content-type', 'application/json');
  for (const cookie of answer.headers.getSetCookie()) headers.append('set-cookie', cookie);
  return new Response(JSON.stringify({ ...problemOf(refusal), url }), { status: told.status, headers });
}
