import { sql } from 'kysely'
import type { Db, Tx } from '../database.ts'
import type { Role } from './roles.contract.ts'

const known = ['id', 'email', 'name', 'role', 'session_epoch as epoch'] as const
const row = ['id', 'email', 'name', 'role', 'made_at', 'left_at', 'password_hash'] as const

/** Someone who may be signed in: an account that is left, or not there, is undefined. */
export function findPerson(db: Db | Tx, id: string) {
  return db
    .selectFrom('person')
    .select(known)
    .where('id', '=', id)
    .where('left_at', 'is', null)
    .executeTakeFirst()
}

export type Known = NonNullable<Awaited<ReturnType<typeof findPerson>>>

/** Who signs in with this e-mail address, however it is capitalized, and the hash to check. */
export function findByEmail(db: Db | Tx, email: string) {
  return db
    .selectFrom('person')
    .select([...known, 'password_hash as hash'])
    .where(sql`lower(email)`, '=', email.toLowerCase())
    .where('left_at', 'is', null)
    .executeTakeFirst()
}

/** Someone's password hash. Undefined when none was set, or the account is left. */
export async function hashOf(db: Db, id: string): Promise<string | undefined> {
  const found = await db
    .selectFrom('person')
    .select('password_hash')
    .where('id', '=', id)
    .where('left_at', 'is', null)
    .executeTakeFirst()
  return found?.password_hash ?? undefined
}

/** Everyone, those who left among them, by name. */
export function listPeople(db: Db) {
  return db
    .selectFrom('person')
    .select(row)
    .orderBy(sql`left_at is not null`)
    .orderBy('name')
    .orderBy('id')
    .execute()
}

/** One of `listPeople`. */
export function findRow(db: Db | Tx, id: string) {
  return db.selectFrom('person').select(row).where('id', '=', id).executeTakeFirst()
}

export type PersonColumns = NonNullable<Awaited<ReturnType<typeof findRow>>>

type NewColumns = {
  email: string
  name: string
  role: Role
  password_hash: string | null
  made_by: string | null
}

/** Makes a person. Undefined when the e-mail address has an account already. */
export async function addPerson(db: Db | Tx, person: NewColumns): Promise<string | undefined> {
  const made = await db
    .insertInto('person')
    .values(person)
    .onConflict((conflict) => conflict.expression(sql`lower(email)`).doNothing())
    .returning('id')
    .executeTakeFirst()
  return made?.id
}

/** Holds every admin's row until the transaction ends, so that two admins can't take each other's role at once. */
export async function lockAdmins(tx: Tx): Promise<Set<string>> {
  const admins = await tx
    .selectFrom('person')
    .select('id')
    .where('role', '=', 'admin')
    .where('left_at', 'is', null)
    .orderBy('id')
    .forUpdate()
    .execute()
  return new Set(admins.map((admin) => admin.id))
}

/** Changes a role, or whether the person is still here. */
export async function changePerson(
  tx: Tx,
  id: string,
  change: { role?: Role | undefined; left?: boolean | undefined },
) {
  await tx
    .updateTable('person')
    .set({
      ...(change.role !== undefined && { role: change.role }),
      ...(change.left !== undefined && { left_at: change.left ? sql<Date>`coalesce(left_at, now())` : null }),
    })
    .where('id', '=', id)
    .execute()
}

/** Tells every server process that a session of this person has ended: what is open for them is looked at anew. */
export async function saySessionEnded(db: Db | Tx, id: string): Promise<void> {
  await sql`select pg_notify('look_again', ${id})`.execute(db)
}

/** Ends every session of a person, on all devices. */
export async function endSessions(tx: Tx, id: string): Promise<void> {
  await tx
    .updateTable('person')
    .set((eb) => ({ session_epoch: eb('session_epoch', '+', 1) }))
    .where('id', '=', id)
    .execute()
  await tx
    .deleteFrom('session')
    .where(sql`sess ->> 'person'`, '=', id)
    .execute()
  await saySessionEnded(tx, id)
}

/** Sets a password, which ends every session and every link that could set another. */
export async function setPassword(tx: Tx, id: string, hash: string): Promise<void> {
  await tx.updateTable('person').set({ password_hash: hash }).where('id', '=', id).execute()
  await endLinks(tx, id)
  await endSessions(tx, id)
}

/** Ends the links of a person that nobody has used. */
export async function endLinks(tx: Tx, id: string): Promise<void> {
  await tx
    .updateTable('one_time_link')
    .set({ expires_at: sql<Date>`now()` })
    .where('person_id', '=', id)
    .where('used_at', 'is', null)
    .where('expires_at', '>', sql<Date>`now()`)
    .execute()
}

/** Keeps the hash of a link's token. Returns when the link ends. */
export async function keepLink(tx: Tx, hash: string, personId: string, madeBy: string | null, days: number) {
  const kept = await tx
    .insertInto('one_time_link')
    .values({
      token_hash: hash,
      kind: 'set-password',
      person_id: personId,
      made_by: madeBy,
      expires_at: sql<Date>`now() + make_interval(days => ${days})`,
    })
    .returning('expires_at')
    .executeTakeFirstOrThrow()
  return kept.expires_at
}

/** Whose link this is. Undefined when it was used, has ended or never was. */
export function findLink(db: Db, hash: string) {
  return db
    .selectFrom('one_time_link as l')
    .innerJoin('person as p', 'p.id', 'l.person_id')
    .select(['p.id', 'p.name', 'p.email', 'l.expires_at'])
    .where('l.token_hash', '=', hash)
    .where('l.used_at', 'is', null)
    .where('l.expires_at', '>', sql<Date>`now()`)
    .where('p.left_at', 'is', null)
    .executeTakeFirst()
}

/** Uses a link up. Undefined when somebody else was quicker. */
export function useUpLink(tx: Tx, hash: string) {
  return tx
    .updateTable('one_time_link')
    .set({ used_at: sql<Date>`now()` })
    .where('token_hash', '=', hash)
    .where('used_at', 'is', null)
    .where('expires_at', '>', sql<Date>`now()`)
    .returning('person_id as personId')
    .executeTakeFirst()
}

/** Makes a demo person, or sets one back to how they are meant to be. Somebody's own account is never touched. */
export async function keepDemoPerson(db: Db, person: Omit<NewColumns, 'made_by'>): Promise<void> {
  await db
    .insertInto('person')
    .values({ ...person, demo: true })
    .onConflict((conflict) =>
      conflict
        .expression(sql`lower(email)`)
        .doUpdateSet({
          name: person.name,
          role: person.role,
          password_hash: person.password_hash,
          left_at: null,
        })
        .where('person.demo', '=', true),
    )
    .execute()
}

/** The demo person with a role. Undefined where there is none. */
export function findDemoPerson(db: Db, role: Role) {
  return db
    .selectFrom('person')
    .select(known)
    .where('demo', '=', true)
    .where('role', '=', role)
    .where('left_at', 'is', null)
    .limit(1)
    .executeTakeFirst()
}

/** Everyone whose password everyone knows. */
export async function listDemoPeople(tx: Tx): Promise<string[]> {
  const found = await tx
    .selectFrom('person')
    .select('id')
    .where('demo', '=', true)
    .where('left_at', 'is', null)
    .execute()
  return found.map((person) => person.id)
}

/** Takes a password away: nobody signs in with it any more. */
export async function clearPassword(tx: Tx, id: string): Promise<void> {
  await tx.updateTable('person').set({ password_hash: null }).where('id', '=', id).execute()
}

/** Forgets tries that count no more. */
export async function forgetTries(db: Db): Promise<void> {
  await db.deleteFrom('sign_in_try').where('expire', '<', Date.now()).execute()
}
