import type { NextRequest } from 'next/server';
import type { Db } from '@/lib/database';
import { Conflict, Invalid, TooMany, type FieldError } from '@/lib/errors/errors';
import { parsed } from '@/lib/http/body';
import { SIGN_UP_FIELDS, SignUp } from './schema';
import { seeOther, signInByForm } from './sign-in-form';
import { signUpFrom } from './sign-up';
import { forgetTyped, keepTyped } from './typed';

type SignUpField = (typeof SIGN_UP_FIELDS)[number];

/**
 * Answers the sign-up page's form: makes the account and signs it in, or leads back to the page with what was typed (but
 * the password) and what to mend.
 */
export async function signUpByForm(
  db: Db,
  request: NextRequest,
  { email = '', name = '', password = '', callbackUrl = '/orchards' }: Record<string, string>,
): Promise<Response> {
  try {
    const body = parsed(SignUp, { email, name, password });
    await signUpFrom(db, body, request.headers);
  } catch (error) {
    const query = new URLSearchParams({ callbackUrl });
    const errors = errorsOf(error);
    return seeOther(`/sign-up?${query.toString()}`, [keepTyped('/sign-up', { email, name, errors })]);
  }
  return signInByForm(request, { email, password, callbackUrl }, [forgetTyped('/sign-up')]);
}

function errorsOf(error: unknown): { path: SignUpField; message: string }[] {
  if (error instanceof Invalid) return error.errors.filter(isOfForm);
  if (error instanceof Conflict) return [{ path: 'email', message: error.message }];
  if (error instanceof TooMany) return [{ path: 'email', message: error.message }];
  throw error;
}

function isOfForm(error: FieldError): error is FieldError & { path: SignUpField } {
  return (SIGN_UP_FIELDS as readonly string[]).includes(error.path);
}
