import { z } from 'zod';
import { isCommonPassword } from './common-passwords';
import { ROLES } from './actor';

const SHORTEST_PASSWORD = 12;
const LONGEST_PASSWORD = 200;
const PRINTABLE = /^\P{Cc}*$/u;

/** An address as it is stored and looked up. */
export function writtenEmail(email: string): string {
  return email.trim().toLowerCase();
}

export const Email = z
  .string('must be an e-mail address')
  .max(254, 'must have at most 254 characters')
  .transform(writtenEmail)
  .pipe(z.email('must be an e-mail address, such as name@farm.example'));

/** How somebody is called in public, beside what they recorded. */
export const PersonName = z
  .string('must be text')
  .trim()
  .min(1, 'is needed: it stands beside what you publish')
  .max(80, 'must have at most 80 characters')
  .regex(PRINTABLE, 'must not hold control characters');

export const Password = z
  .string('must be text')
  .refine(
    (text) => [...text].length >= SHORTEST_PASSWORD,
    `must have at least ${SHORTEST_PASSWORD} characters`,
  )
  .max(LONGEST_PASSWORD, `must have at most ${LONGEST_PASSWORD} characters`)
  .refine((text) => !isCommonPassword(text), 'is among the first that a guesser tries; choose another');

/** In the order of the form. */
export const SIGN_UP_FIELDS = ['name', 'email', 'password'] as const;

export const SignUp = z
  .strictObject({ email: Email, name: PersonName, password: Password })
  .superRefine(({ email, name, password }, context) => {
    const plain = (text: string) => text.toLowerCase().replace(/\s+/g, '');
    const own = [email, email.split('@')[0] ?? '', email.split('@')[1] ?? '', name].map(plain);
    if (own.includes(plain(password))) {
      const message = 'is your own name or address; choose something that others do not know';
      context.addIssue({ code: 'custom', path: ['password'], message });
    }
  });
export type SignUp = z.output<typeof SignUp>;

export const SignedUp = z.object({ id: z.string(), name: z.string() });

export const RoleBody = z.strictObject({ role: z.enum(ROLES, `must be one of ${ROLES.join(', ')}`) });

/** A person as admins see them. */
export const Person = z.object({
  id: z.string(),
  email: z.string(),
  name: z.string(),
  role: z.enum(ROLES),
  disabled: z.boolean(),
});
export type Person = z.output<typeof Person>;
