import { compareSync } from 'bcryptjs'
import { sql } from 'kysely'
import { afterAll, beforeAll, describe, expect, test } from 'vitest'

import demoPeople from '../../server/people/demo-people.json' with { type: 'json' }
import { seedDemoPeople, shutOutDemoPeople } from '../../server/people/demo-people.ts'
import { openLog } from '../../server/log.ts'
import { Asker, demoPerson, signedIn } from './asker.ts'
import { testDatabase } from './database.ts'
import type { TestDatabase } from './database.ts'
import { runApp } from './running-app.ts'
import type { RunningApp } from './running-app.ts'

let database: TestDatabase
let app: RunningApp
const logged: string[] = []
beforeAll(async () => {
  database = await testDatabase()
  await seedDemoPeople(database.db)
  app = await runApp(database.url, {
    log: openLog('info', { write: (line: string) => void logged.push(line) }),
  })
})
afterAll(async () => {
  await app.close()
  await database.close()
})

const newPassword = 'three wires, one bond'
let count = 0
/** Someone with an account of their own, signed in. */
async function signUp() {
  const person = { email: `someone${++count}@example.test`, name: 'Someone', password: 'porch light is out' }
  const asker = new Asker(app)
  const answer = await asker.post('/api/sign-up', person)
  expect(await answer.json()).toMatchObject({ person: { role: 'helper' } })
  return { asker, ...person }
}
const signInAs = async ({ email, password }: { email: string; password: string }) => {
  const asker = new Asker(app)
  expect((await asker.post('/api/sign-in', { email, password })).status).toBe(200)
  return asker
}

describe('a session', () => {
  test('is begun under a new id, whatever id came along', async () => {
    const victim = new Asker(app)
    const attacker = await signedIn(app, 'helper')
    const planted = attacker.cookieNamed('tracelamp')!
    victim.setCookie('tracelamp', planted)
    await victim.post('/api/sign-in', demoPerson('tech'))
    expect(victim.cookieNamed('tracelamp')).not.toBe(planted)
    expect(await victim.whoAmI()).toBe(demoPerson('tech').email)
    expect(await attacker.whoAmI()).not.toBe(demoPerson('tech').email)
  })

  test('has a cookie that no script reads and no other site sends; behind TLS only TLS carries it', async () => {
    const line = async (url: string, headers: Record<string, string> = {}) => {
      const answer = await new Asker({ url }).ask('POST', '/api/sign-in', {
        body: demoPerson('helper'),
        headers,
      })
      return answer.headers.getSetCookie().find((cookie) => cookie.startsWith('tracelamp='))!
    }
    const plain = await line(app.url)
    expect(plain).toMatch(/; HttpOnly/i)
    expect(plain).toMatch(/; SameSite=Lax/i)
    expect(plain).not.toMatch(/; Secure/i)
    expect(plain).not.toMatch(/; Domain/i)
    const expires = Date.parse(/expires=([^;]+)/i.exec(plain)![1]!)
    expect(Math.abs(expires - Date.now() - 30 * 86_400_000)).toBeLessThan(60_000)
    const behindProxy = await runApp(database.url, { trustProxy: 1 })
    expect(await line(behindProxy.url, { 'x-forwarded-proto': 'https' })).toMatch(/; Secure/i)
    await behindProxy.close()
  })

  test('with a forged or unknown cookie is none', async () => {
    for (const value of ['s%3Anonsense.nonsense', 'nonsense', "s%3A' or 1=1", '']) {
      const asker = new Asker(app)
      asker.setCookie('tracelamp', value)
      expect(await asker.whoAmI()).toBeNull()
    }
  })

  test('of nobody is told to forget nothing: a late answer would take away what a sign-in has set meanwhile', async () => {
    expect((await new Asker(app).get('/api/me')).headers.getSetCookie()).toEqual([])
    const ended = new Asker(app)
    ended.setCookie('tracelamp', 's%3Aended.ended')
    await ended.get('/api/me')
    expect(ended.cookieNamed('tracelamp')).toBeUndefined()
  })

  test('is written once a day, not with every request', async () => {
    const asker = await signedIn(app, 'senior')
    const written = async () => {
      const { rows } = await sql`select xmin::text, expire from session order by sid`.execute(database.db)
      return JSON.stringify(rows)
    }
    const before = await written()
    for (let n = 0; n < 3; n++) await asker.whoAmI()
    expect(await written()).toBe(before)
    await database.db
      .updateTable('session')
      .set({ sess: sql`jsonb_set(sess::jsonb, '{day}', '"2020-01-01"')::json` })
      .execute()
    const answer = await asker.get('/api/me')
    expect(answer.headers.getSetCookie().join()).toMatch(/^tracelamp=/)
    expect(await written()).not.toBe(before)
  })

  test('ends at sign-out, for whoever copied its cookie too', async () => {
    const { asker } = await signUp()
    const copy = new Asker(app)
    copy.setCookie('tracelamp', asker.cookieNamed('tracelamp')!)
    expect(await copy.whoAmI()).not.toBeNull()
    expect(await (await asker.post('/api/sign-out')).json()).toEqual({ person: null })
    expect(asker.cookieNamed('tracelamp')).toBeUndefined()
    expect(await copy.whoAmI()).toBeNull()
  })

  test('ends everywhere on request', async () => {
    const person = await signUp()
    const elsewhere = await signInAs(person)
    await person.asker.post('/api/sign-out-everywhere')
    expect([await person.asker.whoAmI(), await elsewhere.whoAmI()]).toEqual([null, null])
    await signInAs(person)
  })

  test('ends everywhere with a new password, but where it was set', async () => {
    const person = await signUp()
    const elsewhere = await signInAs(person)
    const before = person.asker.cookieNamed('tracelamp')
    const change = { current: person.password, password: newPassword }
    expect((await person.asker.post('/api/account/password', change)).status).toBe(200)
    expect([await person.asker.whoAmI(), await elsewhere.whoAmI()]).toEqual([person.email, null])
    expect(person.asker.cookieNamed('tracelamp')).not.toBe(before)
    expect((await new Asker(app).post('/api/sign-in', person)).status).toBe(401)
    await signInAs({ ...person, password: newPassword })
  })

  test('ends everywhere with another role, and when the person leaves; then nobody is let in', async () => {
    const admin = await signedIn(app, 'admin')
    const person = await signUp()
    const id = ((await (await person.asker.get('/api/me')).json()) as { person: { id: string } }).person.id
    const change = (body: unknown) => admin.ask('PATCH', `/api/people/${id}`, { body })
    expect((await change({ role: 'tech' })).status).toBe(200)
    expect(await person.asker.whoAmI()).toBeNull()
    const again = await signInAs(person)
    expect(await (await again.get('/api/me')).json()).toMatchObject({ person: { role: 'tech' } })
    const { token } = (await (await admin.post(`/api/people/${id}/link`)).json()) as { token: string }
    expect((await change({ left: true })).status).toBe(200)
    expect(await again.whoAmI()).toBeNull()
    expect((await new Asker(app).post('/api/sign-in', person)).status).toBe(401)
    expect((await new Asker(app).get(`/api/links/${token}`)).status).toBe(404)
    expect((await change({ left: false })).status).toBe(200)
    await signInAs(person)
  })

  test('that is written late, after all were ended, is none', async () => {
    const person = await signUp()
    const copy = new Asker(app)
    copy.setCookie('tracelamp', person.asker.cookieNamed('tracelamp')!)
    const rows = await database.db.selectFrom('session').select(['sid', 'sess', 'expire']).execute()
    await person.asker.post('/api/sign-out-everywhere')
    const late = rows.map((row) => ({ ...row, sess: JSON.stringify(row.sess) }))
    const { numInsertedOrUpdatedRows } = await database.db
      .insertInto('session')
      .values(late)
      .onConflict((conflict) => conflict.doNothing())
      .executeTakeFirstOrThrow()
    expect(Number(numInsertedOrUpdatedRows)).toBe(1)
    expect(await copy.whoAmI()).toBeNull()
  })
})

describe('another site’s page', () => {
  const body = demoPerson('helper')
  test.each([
    ['says that it is another site', { 'sec-fetch-site': 'cross-site' }, 403],
    ['is a neighbor of ours', { 'sec-fetch-site': 'same-site' }, 403],
    [
      'has another origin, in an old browser',
      { 'sec-fetch-site': '', origin: 'http://elsewhere.example.test' },
      403,
    ],
    ['hides its origin', { 'sec-fetch-site': '', origin: 'null' }, 403],
    ['says nothing at all', { 'sec-fetch-site': '' }, 403],
    ['posts a form', { 'content-type': 'application/x-www-form-urlencoded' }, 415],
    ['posts JSON as plain text', { 'content-type': 'text/plain' }, 415],
  ])('that %s is refused', async (_what, headers: Record<string, string>, status) => {
    const asker = await signedIn(app, 'helper')
    const said = Object.fromEntries(Object.entries(headers).filter(([, value]) => value !== ''))
    const send = (path: string) =>
      fetch(`${app.url}${path}`, {
        method: 'POST',
        headers: {
          cookie: asker.cookie(),
          'content-type': 'application/json',
          ...('sec-fetch-site' in headers ? {} : { 'sec-fetch-site': 'same-origin' }),
          ...said,
        },
        body: JSON.stringify(body),
      })
    for (const path of ['/api/sign-in', '/api/sign-out', '/api/sign-out-everywhere', '/api/account/password'])
      expect([path, (await send(path)).status]).toEqual([path, status])
    expect(await asker.whoAmI()).toBe(body.email)
  })

  test('is told from our own, in a browser that only names the origin', async () => {
    const answer = await fetch(`${app.url}/api/sign-in`, {
      method: 'POST',
      headers: { origin: app.url, 'content-type': 'application/json' },
      body: JSON.stringify(body),
    })
    expect(answer.status).toBe(200)
  })
})

describe('what is typed', () => {
  test.each([
    ['/api/sign-in', { email: 'no address', password: '' }, ['email', 'password']],
    ['/api/sign-up', { email: '@', name: '  ', password: 'short' }, ['email', 'name', 'password']],
    ['/api/sign-up', { email: 'a@example.test', name: 'A', password: 'x'.repeat(73) }, ['password']],
    ['/api/sign-up', { email: 'a@example.test', name: 'A', password: 'é'.repeat(37) }, ['password']],
    ['/api/sign-up', { email: 'a@example.test', name: 'A', password: 'aaaaaaaaaaaaaaaa' }, ['password']],
    ['/api/sign-in', { email: ['a@example.test'], password: { length: 12 } }, ['email', 'password']],
  ])('in %s is named field by field', async (path, body, fields) => {
    const answer = await new Asker(app).post(path, body)
    expect(answer.status).toBe(400)
    const { errors } = (await answer.json()) as { errors: Record<string, string> }
    expect(Object.keys(errors).sort()).toEqual(fields)
    for (const words of Object.values(errors)) expect(words).toMatch(/^[A-Z].*\.$/)
  })

  test('and is no JSON, or too much, is refused', async () => {
    expect((await new Asker(app).ask('POST', '/api/sign-in', { body: '{' })).status).toBe(400)
    expect((await new Asker(app).post('/api/sign-in', { email: 'x'.repeat(70_000) })).status).toBe(413)
  })

  test('as an e-mail address counts however it is capitalized, and has one account', async () => {
    const person = await signUp()
    await signInAs({ ...person, email: person.email.toUpperCase() })
    const again = await new Asker(app).post('/api/sign-up', {
      ...person,
      email: ` ${person.email.toUpperCase()} `,
    })
    expect(again.status).toBe(409)
    expect(await again.json()).toMatchObject({ errors: { email: expect.any(String) as string } })
  })

  test('at sign-up makes a homeowner, whatever role is asked for', async () => {
    const body = { email: 'sly@example.test', name: 'Sly', password: 'let me be an admin', role: 'admin' }
    expect(await (await new Asker(app).post('/api/sign-up', body)).json()).toMatchObject({
      person: { role: 'helper' },
    })
  })

  test('never reaches the log, nor does a link’s token; a password lies in the database as a hash', async () => {
    const admin = await signedIn(app, 'admin')
    const person = await signUp()
    await new Asker(app).get('/api/links/Zq7secret-token')
    await admin.get('/api/people')
    const all = logged.join('')
    expect(all).toContain('/api/links/…')
    expect(all).not.toMatch(
      new RegExp(`${person.email}|${person.password}|Zq7secret|${admin.cookieNamed('tracelamp')}`),
    )
    const hashes = await database.db.selectFrom('person').select('password_hash').execute()
    for (const { password_hash } of hashes) expect(password_hash).toMatch(/^\$2b\$11\$/)
  })
})

describe('who can’t be let in', () => {
  test('is not told whether there is such an account, in words, headers or time', async () => {
    const known = { email: (await signUp()).email, password: 'not the password' }
    const unknown = { email: 'nobody-here@example.test', password: 'not the password' }
    const times = { known: [] as number[], unknown: [] as number[] }
    const answers: unknown[] = []
    for (let n = 0; n < 5; n++)
      for (const [name, body] of [
        ['known', known],
        ['unknown', unknown],
      ] as const) {
        const since = performance.now()
        const answer = await new Asker(app).post('/api/sign-in', body)
        times[name].push(performance.now() - since)
        answers.push([answer.status, await answer.json(), [...answer.headers.keys()].sort()])
      }
    for (const answer of answers) expect(answer).toEqual(answers[0])
    expect(answers[0]).toMatchObject([401, { title: 'The e-mail address or the password is wrong.' }, {}])
    // Both must do the work of a hash; without it the answer comes in a few milliseconds.
    const [a, b] = [Math.min(...times.known), Math.min(...times.unknown)]
    expect(Math.min(a, b)).toBeGreaterThan(Math.max(a, b) / 2)
  })

  test('are demo people, wherever others reach the server', async () => {
    for (const { password, hash } of demoPeople) expect(compareSync(password, hash)).toBe(true)
    const own = await testDatabase()
    await seedDemoPeople(own.db)
    const server = await runApp(own.url)
    const before = await signedIn(server, 'admin')
    await shutOutDemoPeople(own.db)
    expect(await before.whoAmI()).toBeNull()
    for (const { email, password } of demoPeople)
      expect((await new Asker(server).post('/api/sign-in', { email, password })).status).toBe(401)
    await seedDemoPeople(own.db)
    await signedIn(server, 'admin')
    await server.close()
    await own.close()
  })
})

describe('a one-time link', () => {
  test('lets a new person set a password, once, and signs them in', async () => {
    const admin = await signedIn(app, 'admin')
    const made = await admin.post('/api/people', { email: 'new@example.test', name: 'New', role: 'senior' })
    const { person, link } = (await made.json()) as {
      person: { id: string; hasPassword: boolean }
      link: { token: string }
    }
    expect(person.hasPassword).toBe(false)
    const asker = new Asker(app)
    expect(await (await asker.get(`/api/links/${link.token}`)).json()).toMatchObject({
      email: 'new@example.test',
    })
    expect((await asker.post(`/api/links/${link.token}`, { password: 'short' })).status).toBe(400)
    const both = await Promise.all(
      [new Asker(app), asker].map((one) => one.post(`/api/links/${link.token}`, { password: newPassword })),
    )
    expect(both.map((answer) => answer.status).sort()).toEqual([200, 404])
    expect((await asker.get(`/api/links/${link.token}`)).status).toBe(404)
    await signInAs({ email: 'new@example.test', password: newPassword })
    const kept = JSON.stringify(await database.db.selectFrom('one_time_link').selectAll().execute())
    expect(kept).not.toContain(link.token)
  })

  test('ends the one before it, ends with its time, and ends sessions when it is used', async () => {
    const admin = await signedIn(app, 'admin')
    const person = await signUp()
    const { id } = ((await (await person.asker.get('/api/me')).json()) as { person: { id: string } }).person
    const link = async () =>
      ((await (await admin.post(`/api/people/${id}/link`)).json()) as { token: string }).token
    const [first, second] = [await link(), await link()]
    const use = (token: string) => new Asker(app).post(`/api/links/${token}`, { password: newPassword })
    expect((await use(first)).status).toBe(404)
    expect(await person.asker.whoAmI()).toBe(person.email)
    expect((await use(second)).status).toBe(200)
    expect(await person.asker.whoAmI()).toBeNull()
    const third = await link()
    await database.db
      .updateTable('one_time_link')
      .set({ expires_at: new Date(Date.now() - 1000) })
      .execute()
    expect((await use(third)).status).toBe(404)
  })
})
