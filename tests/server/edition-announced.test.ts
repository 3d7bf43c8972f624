import { sql } from 'kysely'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { EditionAnnounced } from '../../server/editions/editions.contract.ts'
import { putInForce } from '../../server/editions/put-in-force.ts'
import { testDatabase } from './database.ts'
import type { TestDatabase } from './database.ts'
import { runApp } from './running-app.ts'
import type { RunningApp } from './running-app.ts'
import { changedEdition, starterBytes } from './some-edition.ts'
import { until } from './until.ts'

let database: TestDatabase
let one: RunningApp
let other: RunningApp
beforeAll(async () => {
  database = await testDatabase()
  await putInForce(database.db, starterBytes, { note: 'starter edition', reason: 'test' })
  one = await runApp(database.url)
  other = await runApp(database.url)
})
afterAll(async () => {
  await one.close()
  await other.close()
  await database.close()
})

const announced = (app: RunningApp, hash: string) =>
  until(() => (app.feed.current?.hash === hash ? app.feed.current : undefined))

/** Listens as a page does; `next` waits for the next edition it is told of. */
async function listen(app: RunningApp) {
  const stop = new AbortController()
  const answer = await fetch(`${app.url}/api/edition/events`, { signal: stop.signal })
  const reader = answer.body!.pipeThrough(new TextDecoderStream()).getReader()
  let text = ''
  const next = async (): Promise<EditionAnnounced> => {
    for (;;) {
      const event = /event: edition\nid: \d+\ndata: (.*)\n\n/.exec(text)
      if (event !== null) {
        text = text.slice(event.index + event[0].length)
        return EditionAnnounced.parse(JSON.parse(event[1]!))
      }
      const { done, value } = await reader.read()
      if (done) throw new Error('the stream ended')
      text += value
    }
  }
  return { answer, next, stop: () => stop.abort() }
}

test('every server process knows the edition in force from its start', async () => {
  await announced(one, starterBytes.hash)
  await announced(other, starterBytes.hash)
})

test('an edition put in force by one process reaches the others, and every open page', async () => {
  const page = await listen(other)
  expect(page.answer.headers.get('content-type')).toMatch(/^text\/event-stream/)
  expect(page.answer.headers.get('cache-control')).toMatch(/no-store/)
  expect(await page.next()).toEqual({ number: 1, hash: starterBytes.hash })

  const next = changedEdition('Announced')
  await putInForce(one.db, next, { note: 'second edition', reason: 'test' })
  expect(await page.next()).toEqual({ number: 2, hash: next.hash })
  await announced(one, next.hash)
  page.stop()
})

test('what was put in force while the listener was cut off is known once it is back', async () => {
  await until(async () => {
    const { rows } = await sql<{ pid: number }>`
      select pid from pg_stat_activity where datname = current_database() and query ilike 'listen%edition_in_force%'
    `.execute(database.db)
    return rows.length === 2 ? true : undefined
  })
  const { rows } = await sql<{ gone: boolean }>`
    select pg_terminate_backend(pid) as gone from pg_stat_activity
    where datname = current_database() and query ilike 'listen%edition_in_force%'
  `.execute(database.db)
  expect(rows).toHaveLength(2)
  const next = changedEdition('While nobody listened')
  await putInForce(database.db, next, { note: 'third edition', reason: 'test' })
  await announced(one, next.hash)
  await announced(other, next.hash)

  const after = changedEdition('Once they listen again')
  await putInForce(database.db, after, { note: 'fourth edition', reason: 'test' })
  await announced(one, after.hash)
  await announced(other, after.hash)
})

test('a server that closes ends its open streams', async () => {
  const third = await runApp(database.url)
  await until(() => third.feed.current)
  const page = await listen(third)
  await page.next()
  const ended = page.next().catch(() => 'ended')
  await third.close()
  expect(await ended).toBe('ended')
})
