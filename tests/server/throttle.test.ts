import { afterAll, beforeAll, beforeEach, expect, test } from 'vitest'
import { networkOf } from '../../server/people/network-of.ts'
import { seedDemoPeople } from '../../server/people/demo-people.ts'
import { Asker, demoPerson, signedIn } from './asker.ts'
import { testDatabase } from './database.ts'
import type { TestDatabase } from './database.ts'
import { runApp } from './running-app.ts'
import type { RunningApp } from './running-app.ts'

let database: TestDatabase
let one: RunningApp
let other: RunningApp
beforeAll(async () => {
  database = await testDatabase()
  await seedDemoPeople(database.db)
  // One proxy, so that a test can come from any address.
  one = await runApp(database.url, { trustProxy: 1 })
  other = await runApp(database.url, { trustProxy: 1 })
})
afterAll(async () => {
  await one.close()
  await other.close()
  await database.close()
})
beforeEach(async () => {
  await database.db.deleteFrom('sign_in_try').execute()
})

const wrong = (email: string) => ({ email, password: 'a wrong password' })
const from = (app: RunningApp, address: string, body: unknown, asker = new Asker(app)) =>
  asker.ask('POST', '/api/sign-in', { body, headers: { 'x-forwarded-for': address } })
const statuses = (answers: Response[]) =>
  answers.reduce<Record<number, number>>(
    (sum, { status }) => ({ ...sum, [status]: (sum[status] ?? 0) + 1 }),
    {},
  )

test('guessing at one account from many addresses ends after ten tries, also over several servers at once', async () => {
  const { email } = demoPerson('tech')
  const tries = Array.from({ length: 16 }, (_, n) => from(n % 2 ? one : other, `10.0.${n}.1`, wrong(email)))
  const answers = await Promise.all(tries)
  expect(statuses(answers)).toEqual({ 401: 10, 429: 6 })
  const refused = answers.find((answer) => answer.status === 429)!
  expect(await refused.json()).toMatchObject({
    type: '/problems/too-many',
    title: expect.any(String) as string,
  })
  expect(Number(refused.headers.get('retry-after'))).toBeGreaterThan(3000)
  // The right password is not let through either, or guessing would go on.
  expect((await from(one, '10.9.9.9', demoPerson('tech'))).status).toBe(429)
  expect((await from(one, '10.9.9.9', demoPerson('senior'))).status).toBe(200)
})

test('meanwhile the owner comes in on a device used before; a mark made up or another’s does not help', async () => {
  const known = await signedIn(one, 'tech')
  const strangers = await signedIn(one, 'helper')
  await known.post('/api/sign-out')
  const { email } = demoPerson('tech')
  await Promise.all(Array.from({ length: 12 }, (_, n) => from(one, `10.1.${n}.1`, wrong(email))))
  expect((await from(one, '10.2.0.1', demoPerson('tech'))).status).toBe(429)
  expect((await from(one, '10.2.0.1', demoPerson('tech'), strangers)).status).toBe(429)
  for (const signature of ['0'.repeat(64), '\u00e9'.repeat(64), '']) {
    const forged = new Asker(one)
    forged.setCookie('tracelamp-device', `${'0'.repeat(32)}.${signature}`)
    expect((await from(one, '10.2.0.1', demoPerson('tech'), forged)).status).toBe(429)
  }
  expect((await from(one, '10.2.0.1', demoPerson('tech'), known)).status).toBe(200)
})

test('a device used before has tries of its own, which end too', async () => {
  const known = await signedIn(one, 'senior')
  const answers: Response[] = []
  for (let n = 0; n < 12; n++)
    answers.push(await from(one, `10.3.${n}.1`, wrong(demoPerson('senior').email), known))
  expect(statuses(answers)).toEqual({ 401: 10, 429: 2 })
})

test('one address ends after thirty tries at any accounts, and takes no other address with it', async () => {
  const answers = await Promise.all(
    Array.from({ length: 33 }, (_, n) =>
      from(n % 2 ? one : other, '10.4.0.1', wrong(`guess${n}@example.test`)),
    ),
  )
  expect(statuses(answers)).toEqual({ 401: 30, 429: 3 })
  expect((await from(one, '10.4.0.1', demoPerson('helper'))).status).toBe(429)
  expect((await from(one, '10.4.0.2', demoPerson('helper'))).status).toBe(200)
})

test('right passwords use nothing up', async () => {
  for (let n = 0; n < 12; n++) expect((await from(one, '10.5.0.1', demoPerson('helper'))).status).toBe(200)
})

test('the current password can’t be guessed at from an open session', async () => {
  const asker = await signedIn(one, 'helper')
  const answers: Response[] = []
  for (let n = 0; n < 11; n++)
    answers.push(
      await asker.post('/api/account/password', { current: `guess ${n}`, password: 'three wires, one bond' }),
    )
  expect(statuses(answers)).toEqual({ 400: 10, 429: 1 })
})

test('neither e-mail addresses nor addresses lie among the tries', async () => {
  await from(one, '10.6.0.1', wrong('written-down@example.test'))
  const kept = JSON.stringify(await database.db.selectFrom('sign_in_try').select('key').execute())
  expect(kept).not.toMatch(/10\.6\.0\.1|written-down/)
})

test.each([
  ['192.0.2.7', '192.0.2.7'],
  ['::ffff:192.0.2.7', '192.0.2.7'],
  ['2001:db8:1:2:3:4:5:6', '2001:db8:1:2::/64'],
  ['2001:0db8:0001:0002::9', '2001:db8:1:2::/64'],
  ['2001:db8::1', '2001:db8:0:0::/64'],
  ['::1', '0:0:0:0::/64'],
  ['fe80::1%eth0', 'fe80:0:0:0::/64'],
  [undefined, 'unknown'],
])('the address %s counts as %s', (address, network) => {
  expect(networkOf(address)).toBe(network)
})
