import { randomBytes } from 'node:crypto';
import { NextResponse, type NextRequest } from 'next/server';
import { PATH_HEADER } from '@/lib/auth/next-path';
import { contentSecurityPolicy } from '@/lib/http/content-security-policy';

/**
 * Gives each page its nonce and its own path. It lets nobody in and keeps nobody out: access is decided where data
 * is read and written, and the database is never asked here.
 */
export function proxy(request: NextRequest): NextResponse {
  const policy = contentSecurityPolicy(randomBytes(16).toString('base64'));
  const headers = new Headers(request.headers);
  headers.set('content-security-policy', policy);
  headers.set(PATH_HEADER, request.nextUrl.pathname + request.nextUrl.search);
  const response = NextResponse.next({ request: { headers } });
  response.headers.set('content-security-policy', policy);
  return response;
}

export const config = { matcher: '/((?!api/|_next/static|_next/image|.*\\.[a-z0-9]+$).*)' };
