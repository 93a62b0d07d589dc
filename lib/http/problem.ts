import type { Refusal } from '@/lib/errors/errors';

export const PROBLEM_TYPE = 'application/problem+json';

type Problem = { title: string; status: number; detail: string; [member: string]: unknown };

/** A problem document (RFC 9457). It never carries a stack, a path on disk or SQL. */
export function problem(body: Problem, headers: Record<string, string> = {}): Response {
  return new Response(JSON.stringify({ type: 'about:blank', ...body }), {
    status: body.status,
    headers: { 'content-type': PROBLEM_TYPE, 'cache-control': 'no-store', ...headers },
  });
}

/** The problem document of a refusal. */
export function refused(refusal: Refusal, headers: Record<string, string> = {}): Response {
  return problem(
    { title: refusal.title, status: refusal.status, detail: refusal.message, ...refusal.extra },
    { ...refusal.headers, ...headers },
  );
}
