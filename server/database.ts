import { CompiledQuery, Kysely, PostgresDialect } from 'kysely'
import type { ColumnType, Generated, Transaction } from 'kysely'
import pg from 'pg'
import type { Log } from './log.ts'

type Audience = 'everyone' | 'qualified'
type Role = 'helper' | 'tech' | 'senior' | 'admin'
/** Written once, by the database's clock. */
type Stamp = ColumnType<Date, never, never>

/** jsonb: written as text, since the driver would take a list for an array of PostgreSQL's. */
type Json = ColumnType<unknown, string, string>

/** The tables, as the migrations leave them. */
export type Database = {
  edition: { number: number; hash: string; note: string; made_at: Stamp }
  edition_file: { edition_number: number; name: string; audience: Audience; hash: string; bytes: Buffer }
  edition_in_force: { id: Generated<number>; edition_number: number; since: Stamp; reason: string }
  person: {
    id: Generated<string>
    email: string
    name: string
    role: Role
    password_hash: string | null
    session_epoch: Generated<number>
    demo: Generated<boolean>
    made_at: Stamp
    made_by: string | null
    left_at: Date | null
  }
  session: { sid: string; sess: unknown; expire: Date }
  one_time_link: {
    token_hash: string
    kind: 'set-password'
    person_id: string
    made_at: Stamp
    made_by: string | null
    expires_at: Date
    used_at: Date | null
  }
  sheet: {
    id: string
    owner_id: string | null
    key_hash: string | null
    kind: 'triage' | 'diagnosis'
    title: string
    context: Json
    edition_hash: string
    made_at: Date
    changed_at: Date
    server_at: Stamp
  }
  sheet_entry: {
    id: string
    /** In the order they came; a whole number, which the driver hands over as text. */
    seq: ColumnType<string, never, never>
    sheet_id: string
    mode: string
    finding: string
    value: Json | null
    kept: Json | null
    after: string[]
    by_person: string | null
    by_name: string | null
    device_at: Date
    server_at: Stamp
  }
  sheet_result: {
    sheet_id: string
    edition_hash: string
    result: Json
    made_at: ColumnType<Date, never, Date>
  }
  sheet_link: { token_hash: string; sheet_id: string; made_at: Stamp; taken_back_at: Date | null }
  sign_in_try: { key: string; points: number; expire: number | null }
  article_draft: {
    slug: string
    version: number
    pending: boolean
    head: ColumnType<unknown, string, string>
    body: string
    base: string | null
    edited_by: string
    edited_at: ColumnType<Date, never, Date>
    sitting_since: ColumnType<Date, never, Date>
  }
  article_revision: {
    slug: string
    number: number
    head: ColumnType<unknown, string, never>
    body: string
    author: string | null
    at: ColumnType<Date, Date | undefined, never>
    reason: string
    edition_number: number | null
  }
  article_feedback: {
    id: Generated<number>
    slug: string
    edition_number: number
    helped: boolean
    why: string
    at: Stamp
    person_id: string | null
  }
}

export type Db = Kysely<Database>
export type Tx = Transaction<Database>

/** Opens a pool. Nothing is asked of the server until the first query. */
export function openDatabase(url: string, log: Log): Db {
  const pool = new pg.Pool({
    connectionString: url,
    max: 10,
    connectionTimeoutMillis: 5_000,
    keepAlive: true,
  })
  // An idle connection that breaks is replaced at the next query; unheard, the event would end the process.
  const broke = (error: Error) => log.warn({ reason: error.message }, 'a database connection broke')
  pool.on('error', broke)
  // The pool hears idle clients only: one that is lent out when PostgreSQL dies must be heard too.
  pool.on('connect', (client) => client.on('error', broke))
  return new Kysely<Database>({ dialect: new PostgresDialect({ pool }) })
}

type Query = { text: string; values?: readonly unknown[] }

/**
 * The same pool, as packages that write their own SQL ask for it (sessions and throttling, each with a table of its
 * own). Everything else asks in *.queries.ts.
 */
export const poolOf = (db: Db) => ({
  query: async (query: string | Query, values: readonly unknown[] = []) => {
    const { text, values: own = values } = typeof query === 'string' ? { text: query } : query
    const { rows } = await db.executeQuery<Record<string, unknown>>(CompiledQuery.raw(text, [...own]))
    return { rows, rowCount: rows.length }
  },
})

const downCodes = new Set([
  'ECONNREFUSED',
  'ECONNRESET',
  'EPIPE',
  'ETIMEDOUT',
  'ENOTFOUND',
  '53300', // too many connections
  '57P01', // admin shutdown
  '57P02', // crash shutdown
  '57P03', // starting up
  '08000',
  '08003',
  '08006',
])

/** Whether an error says that the database can't be reached just now, rather than that we asked it wrongly. */
export function isDatabaseDown(error: unknown): boolean {
  if (!(error instanceof Error)) return false
  const code = (error as { code?: unknown }).code
  return (
    (typeof code === 'string' && downCodes.has(code)) ||
    (error instanceof AggregateError && error.errors.some(isDatabaseDown)) ||
    /^Connection terminated|^timeout exceeded when trying to connect|^Client has encountered a connection error/.test(
      error.message,
    )
  )
}
