import * as z from 'zod/mini'
import { Person } from './me.contract.ts'
import { Role } from './roles.contract.ts'

const Moment = z.iso.datetime()

const text = (missing: string) => z.string(missing)
const Email = text('Type an e-mail address.').check(
  z.trim(),
  z.maxLength(254, 'An e-mail address has 254 characters or fewer.'),
  z.regex(/^[^\s@]+@[^\s@]+\.[^\s@]+$/, 'Type an e-mail address, for example name@example.test.'),
)
const Name = text('Type a name.').check(
  z.trim(),
  z.minLength(1, 'Type a name.'),
  z.maxLength(100, 'A name has 100 characters or fewer.'),
)
const KnownPassword = text('Type the password.').check(
  z.minLength(1, 'Type the password.'),
  z.maxLength(1000, 'That is longer than any password here.'),
)

// What bcrypt reads of a password ends there.
const mostBytes = 72
const NewPassword = text('Type a password.').check(
  z.minLength(10, 'A password has 10 characters or more.'),
  z.refine(
    (password) => new TextEncoder().encode(password.normalize('NFC')).length <= mostBytes,
    'A password has 72 characters or fewer; accents and other alphabets count double or more.',
  ),
  z.refine((password) => new Set(password).size >= 5, 'Use more different characters.'),
)

/** POST /api/sign-in */
export const SignIn = z.object({ email: Email, password: KnownPassword })
/** POST /api/sign-up: a homeowner's own account. */
export const SignUp = z.object({ email: Email, name: Name, password: NewPassword })
/** POST /api/account/password */
export const ChangePassword = z.object({ current: KnownPassword, password: NewPassword })
/** POST /api/links/:token */
export const SetPassword = z.object({ password: NewPassword })
/** POST /api/people: someone of the shop, made by an admin. */
export const NewPerson = z.object({
  email: Email,
  name: Name,
  role: z.enum(['tech', 'senior', 'admin'], 'Choose a role.'),
})
/** PATCH /api/people/:id: what it names is changed. */
export const PersonChange = z
  .object({ role: z.optional(Role), left: z.optional(z.boolean()) })
  .check(z.refine((change) => change.role !== undefined || change.left !== undefined, 'Name what to change.'))

/** One row of GET /api/people. */
export const PersonRow = z.extend(Person, {
  madeAt: Moment,
  /** Null while the person is here. */
  leftAt: z.nullable(Moment),
  /** False until a one-time link was used. */
  hasPassword: z.boolean(),
})
export const PeopleList = z.object({ people: z.array(PersonRow) })

/** A one-time link, shown once: the server keeps only its hash. */
export const LinkMade = z.object({ token: z.string(), expiresAt: Moment })
/** POST /api/people */
export const PersonMade = z.object({ person: PersonRow, link: LinkMade })
/** GET /api/links/:token: whose it is. */
export const LinkOpened = z.object({ name: z.string(), email: z.string(), expiresAt: Moment })

export type PersonRow = z.infer<typeof PersonRow>
export type LinkMade = z.infer<typeof LinkMade>
export type NewPerson = z.infer<typeof NewPerson>
