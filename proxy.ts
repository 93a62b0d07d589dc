import { NextResponse, type NextRequest } from 'next/server';

/**
 * Gives every answer its content security policy. Pages get a nonce of their own, which Next puts on its scripts; the
 * API and files get a policy under which nothing runs at all.
 */
export function proxy(request: NextRequest): NextResponse {
  const requestId = crypto.randomUUID();
  const headers = new Headers(request.headers);
  headers.set('x-request-id', requestId);
  if (/^\/(api|dev\/mail\/raw)(\/|$)/.test(request.nextUrl.pathname)) {
    return answer(
      headers,
      "default-src 'none'; frame-ancestors 'none'; base-uri 'none'; form-action 'none'",
      requestId,
    );
  }
  const nonce = Buffer.from(crypto.randomUUID()).toString('base64');
  const policy = [
    "default-src 'self'",
    `script-src 'nonce-${nonce}' 'strict-dynamic'${process.env.NODE_ENV === 'development' ? " 'unsafe-eval'" : ''}`,
    `style-src 'self' 'nonce-${nonce}'`,
    "img-src 'self' data: blob:",
    "font-src 'self'",
    "connect-src 'self'",
    "object-src 'none'",
    "base-uri 'none'",
    "form-action 'self'",
    "frame-ancestors 'none'",
  ].join('; ');
  headers.set('x-nonce', nonce);
  headers.set('content-security-policy', policy);
  return answer(headers, policy, requestId);
}

function answer(headers: Headers, policy: string, requestId: string): NextResponse {
  const response = NextResponse.next({ request: { headers } });
  response.headers.set('content-security-policy', policy);
  response.headers.set('x-request-id', requestId);
  return response;
}
