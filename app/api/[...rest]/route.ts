import type { NextRequest } from 'next/server';
import { Malformed } from '@/lib/errors/errors';
import { MALFORMED_ADDRESS } from '@/lib/http/address';
import { METHODS } from '@/lib/http/handler';
import { problem, refused } from '@/lib/http/problem';

/** Any address under /api that is not there: a problem document too. */
const absent = async (request: NextRequest) =>
  request.nextUrl.pathname === MALFORMED_ADDRESS
    ? refused(new Malformed('The address is not valid percent-encoding.'))
    : problem({
        title: 'Nothing here',
        status: 404,
        detail: 'There is no such address. /api/openapi.json lists them all.',
      });

export const { GET, HEAD, POST, PUT, PATCH, DELETE, OPTIONS } = Object.fromEntries(
  METHODS.map((method) => [method, absent]),
) as Record<(typeof METHODS)[number], typeof absent>;
