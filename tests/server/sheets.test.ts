import { randomBytes, randomUUID } from 'node:crypto'
import { sql } from 'kysely'
import { afterAll, beforeAll, describe, expect, test } from 'vitest'
import { openEdition } from '../../rules/edition/open.ts'
import { readSheet } from '../../rules/findings/parse.ts'
import { diagnose } from '../../rules/ranking/diagnose.ts'
import { openFile } from '../../server/editions/editions.queries.ts'
import { putInForce } from '../../server/editions/put-in-force.ts'
import { seedDemoPeople } from '../../server/people/demo-people.ts'
import { SheetOpened, SheetsPage } from '../../server/sheets/sheets.contract.ts'
import type { NewEntry, SheetHead } from '../../server/sheets/sheet-requests.contract.ts'
import { tokenHash } from '../../server/token.ts'
import { Asker, signedIn } from './asker.ts'
import { testDatabase } from './database.ts'
import type { TestDatabase } from './database.ts'
import { runApp } from './running-app.ts'
import type { RunningApp } from './running-app.ts'
import { changedEdition, starterBytes } from './some-edition.ts'

let database: TestDatabase
let app: RunningApp
let tech: Asker
let senior: Asker
let helper: Asker
let visitor: Asker
beforeAll(async () => {
  database = await testDatabase()
  await putInForce(database.db, starterBytes, { note: 'starter edition', reason: 'test' })
  await seedDemoPeople(database.db)
  app = await runApp(database.url)
  tech = await signedIn(app, 'tech')
  senior = await signedIn(app, 'senior')
  helper = await signedIn(app, 'helper')
  visitor = new Asker(app)
})
afterAll(async () => {
  await app.close()
  await database.close()
})

const at = (minute: number) => new Date(Date.UTC(2026, 10, 30, 9, minute)).toISOString()
const headOf = (more: Partial<SheetHead> = {}): SheetHead => ({
  kind: 'diagnosis',
  title: 'Cabin above the creek',
  context: {
    source: 'power-station',
    system: '120',
    wiring: 'panel',
    mode: 'battery',
    meterOhms: 10_000_000,
  },
  edition: starterBytes.hash,
  madeAt: at(0),
  changedAt: at(0),
  ...more,
})
const entryOf = (finding: string, value: NewEntry['value'], more: Partial<NewEntry> = {}): NewEntry => ({
  id: randomUUID(),
  mode: 'battery',
  finding,
  value,
  kept: null,
  after: [],
  deviceAt: at(1),
  ...more,
})
const key = () => ({ 'sheet-key': randomBytes(32).toString('hex') })

async function begin(asker: Asker, head: Partial<SheetHead> = {}, headers = {}): Promise<string> {
  const id = randomUUID()
  const answer = await asker.ask('PUT', `/api/sheets/${id}`, { body: headOf(head), headers })
  expect([answer.status, await answer.json()]).toEqual([200, { id }])
  return id
}
const add = (asker: Asker, path: string, entries: NewEntry[], headers = {}) =>
  asker.ask('POST', `/api/${path}/entries`, { body: { entries }, headers })
async function open(asker: Asker, path: string, headers = {}): Promise<SheetOpened> {
  const answer = await asker.ask('GET', `/api/${path}`, { headers })
  expect(answer.status).toBe(200)
  return SheetOpened.parse(await answer.json())
}
async function linkTo(asker: Asker, id: string, headers = {}): Promise<string> {
  const answer = await asker.ask('POST', `/api/sheets/${id}/link`, { headers })
  expect(answer.status).toBe(201)
  return ((await answer.json()) as { token: string }).token
}

describe('sent twice is there once', () => {
  test('a sheet, its entries, and both again after somebody has gone on', async () => {
    const id = await begin(tech)
    const first = entryOf('receptacle.hn.volts', 119.6)
    const second = entryOf('receptacle.hn.volts', 57.2, { after: [first.id], deviceAt: at(2) })
    for (const entries of [[first], [first], [first, second], [second, first]]) {
      const answer = await add(tech, `sheets/${id}`, entries)
      expect([answer.status, await answer.json()]).toEqual([200, { ids: entries.map((one) => one.id) }])
    }
    await tech.ask('PUT', `/api/sheets/${id}`, { body: headOf() })
    const opened = await open(tech, `sheets/${id}`)
    expect(opened.entries.map((one) => one.id)).toEqual([first.id, second.id])
    expect(opened.changedAt).toBe(at(2))
  })

  test('an older name never lands on a newer one', async () => {
    const id = await begin(tech)
    for (const head of [
      headOf({ title: 'Newer', changedAt: at(9) }),
      headOf({ title: 'Older', changedAt: at(8) }),
    ])
      expect((await tech.ask('PUT', `/api/sheets/${id}`, { body: head })).status).toBe(200)
    expect((await open(tech, `sheets/${id}`)).title).toBe('Newer')
  })

  test('an id that stands on another sheet is refused, and tells nothing of it', async () => {
    const entry = entryOf('tingle', 'no')
    expect((await add(tech, `sheets/${await begin(tech)}`, [entry])).status).toBe(200)
    const other = await begin(senior)
    expect((await add(senior, `sheets/${other}`, [entry])).status).toBe(409)
    expect((await open(senior, `sheets/${other}`)).entries).toEqual([])
  })
})

describe('readings that contradict each other', () => {
  test('both stay, with who entered them and when; the last is ranked, either stops, no bond is released', async () => {
    const id = await begin(helper, { kind: 'triage' })
    const token = await linkTo(helper, id)
    const first = entryOf('tingle', 'no', { deviceAt: at(1) })
    await add(helper, `sheets/${id}`, [first])
    const theirs = entryOf('tingle', 'yes', { after: [first.id], deviceAt: at(2) })
    const ours = entryOf('tingle', 'no', { after: [], deviceAt: at(3) })
    await add(tech, `shared/${token}`, [ours])
    await add(helper, `sheets/${id}`, [theirs])
    const { entries, result } = await open(helper, `sheets/${id}`)
    expect(entries.map((one) => [one.value, one.by?.name, one.deviceAt])).toEqual([
      ['no', 'Demo homeowner', at(1)],
      ['no', 'Demo tech', at(3)],
      ['yes', 'Demo homeowner', at(2)],
    ])
    expect(result?.stops).toEqual(['tingle'])
    expect(result?.bond).toBe('held-back')
  })

  test('the database itself lets nobody change or remove an entry', async () => {
    const id = await begin(tech)
    await add(tech, `sheets/${id}`, [entryOf('tingle', 'no')])
    for (const change of [sql`update sheet_entry set value = '"yes"'`, sql`delete from sheet_entry`])
      await expect(change.execute(database.db)).rejects.toThrow('never changed or deleted')
  })
})

describe('the result', () => {
  const volts = [
    entryOf('receptacle.hn.volts', 119.6),
    entryOf('receptacle.hg.volts', { value: 57.2, meterOhms: 1_000_000 }),
    entryOf('receptacle.ng.volts', { value: 58, between: [56.1, 59.9] }),
    entryOf('bulb.ng', 'dark', { mode: 'pass-through' }),
  ]

  test('kept with the sheet is what the sheet’s own edition gives again, to the digit', async () => {
    const id = await begin(tech)
    await add(tech, `sheets/${id}`, volts)
    // Another edition comes into force; the sheet stays on its own.
    await putInForce(database.db, changedEdition('Another title'), { note: 'another', reason: 'test' })
    const opened = await open(tech, `sheets/${id}`)
    expect(opened.edition).toBe(starterBytes.hash)

    const kept = await database.db
      .selectFrom('edition')
      .select('number')
      .where('hash', '=', opened.edition)
      .executeTakeFirstOrThrow()
    const edition = openEdition(await openFile(database.db, kept.number, 'diagnosis'))
    const read = readSheet(edition, {
      context: opened.context,
      findings: Object.fromEntries(
        opened.entries.filter((one) => one.mode === 'battery').map((one) => [one.finding, one.value]),
      ),
      otherModes: { 'pass-through': { 'bulb.ng': 'dark' } },
    })
    if (!read.ok) throw new Error(JSON.stringify(read.errors))
    const again = await diagnose(edition, read.sheet)
    expect(opened.result?.ranking).toEqual(again.ranking.map(({ cause, share }) => ({ cause, share })))
    expect(new Set(opened.result?.ranking.map(({ share }) => share)).size).toBeGreaterThan(5)
    expect(opened.result?.edition).toBe(starterBytes.hash)
  })

  test('follows what feeds it, and every finding', async () => {
    const id = await begin(tech)
    const before = (await open(tech, `sheets/${id}`)).result
    await add(
      tech,
      `sheets/${id}`,
      [volts[0]!, volts[1]!].map((one) => ({ ...one, id: randomUUID() })),
    )
    const after = (await open(tech, `sheets/${id}`)).result
    expect(after?.ranking).not.toEqual(before?.ranking)
    const head = headOf({
      changedAt: at(5),
      context: { source: 'generator', system: '120', wiring: 'panel' },
    })
    await tech.ask('PUT', `/api/sheets/${id}`, { body: head })
    expect((await open(tech, `sheets/${id}`)).result?.ranking).not.toEqual(after?.ranking)
  })

  test('leaves out what the edition does not know, and then releases no bond', async () => {
    const id = await begin(tech)
    await add(
      tech,
      `sheets/${id}`,
      [volts[0]!, entryOf('no-such-finding', 3)].map((one) => ({ ...one, id: randomUUID() })),
    )
    const { result, entries } = await open(tech, `sheets/${id}`)
    expect(entries).toHaveLength(2)
    expect(result?.bond).toBe('held-back')
    expect(result?.ranking.length).toBeGreaterThan(20)
  })
})

describe('a link', () => {
  test('opens the sheet to whoever holds it; a tech adds findings; once taken back it opens nothing', async () => {
    const own = key()
    const id = await begin(visitor, { kind: 'triage' }, own)
    const token = await linkTo(visitor, id, own)
    expect((await open(tech, `shared/${token}`)).own).toBe(false)
    expect((await add(tech, `shared/${token}`, [entryOf('tingle', 'no')])).status).toBe(200)
    const seen = await open(visitor, `sheets/${id}`, own)
    expect(seen.entries.map((one) => one.by?.name)).toEqual(['Demo tech'])
    expect(seen.linkMadeAt).not.toBeNull()
    // The link is no way to name the sheet anew, nor to hand out another link.
    expect((await tech.ask('PUT', `/api/sheets/${id}`, { body: headOf({ kind: 'triage' }) })).status).toBe(
      404,
    )
    expect((await tech.post(`/api/sheets/${id}/link`)).status).toBe(404)

    expect((await visitor.ask('DELETE', `/api/sheets/${id}/link`, { headers: own })).status).toBe(200)
    for (const answer of [
      await tech.get(`/api/shared/${token}`),
      await tech.get(`/api/shared/${token}/events`),
      await add(tech, `shared/${token}`, [entryOf('tingle', 'no')]),
    ])
      expect(answer.status).toBe(404)
    expect((await open(visitor, `sheets/${id}`, own)).entries).toHaveLength(1)
  })

  test('made anew ends the one before, and the database keeps no token', async () => {
    const id = await begin(tech)
    const [first, second] = [await linkTo(tech, id), await linkTo(tech, id)]
    expect((await senior.get(`/api/shared/${first}`)).status).toBe(404)
    expect((await senior.get(`/api/shared/${second}`)).status).toBe(200)
    const rows = JSON.stringify(await database.db.selectFrom('sheet_link').selectAll().execute())
    expect(rows).not.toContain(second)
  })
})

describe('without an account', () => {
  test('the device’s key opens its own sheet, and no other does', async () => {
    const own = key()
    const id = await begin(visitor, { kind: 'triage' }, own)
    expect((await add(visitor, `sheets/${id}`, [entryOf('tingle', 'no')], own)).status).toBe(200)
    expect((await open(visitor, `sheets/${id}`, own)).entries[0]?.by).toBeNull()
    for (const headers of [{}, key(), { 'sheet-key': '' }, { 'sheet-key': 'a'.repeat(63) }])
      expect((await visitor.ask('GET', `/api/sheets/${id}`, { headers })).status).toBe(404)
    expect((await tech.get(`/api/sheets/${id}`)).status).toBe(404)
  })

  test('whoever holds the key and has an account now names it as theirs; from then on the key opens nothing', async () => {
    const own = key()
    const id = await begin(visitor, { kind: 'triage' }, own)
    expect((await add(visitor, `sheets/${id}`, [entryOf('tingle', 'no')], own)).status).toBe(200)
    const claim = (asker: Asker, headers: Record<string, string>) =>
      asker.ask('PUT', `/api/sheets/${id}`, { body: headOf({ kind: 'triage' }), headers })
    expect((await claim(senior, key())).status).toBe(404)
    expect((await claim(helper, own)).status).toBe(200)
    expect((await open(helper, `sheets/${id}`)).entries).toHaveLength(1)
    const listed = SheetsPage.parse(await (await helper.get('/api/sheets')).json()).sheets
    expect(listed.map((sheet) => sheet.id)).toContain(id)
    for (const answer of [
      await visitor.ask('GET', `/api/sheets/${id}`, { headers: own }),
      await add(visitor, `sheets/${id}`, [entryOf('tingle', 'yes')], own),
      await claim(senior, own),
    ])
      expect(answer.status).toBe(404)
  })

  test('so many sheets an hour from one address, and then no more', async () => {
    const own = key()
    const ask = async () =>
      (
        await visitor.ask('PUT', `/api/sheets/${randomUUID()}`, {
          body: headOf({ kind: 'triage' }),
          headers: own,
        })
      ).status
    const answers: number[] = []
    while (answers.length < 70 && answers.at(-1) !== 429) answers.push(await ask())
    expect(answers.at(-1)).toBe(429)
    expect(answers.length).toBeGreaterThan(40)
    // Whoever is signed in is not held up by their neighbors.
    await begin(helper, { kind: 'triage' })
  })

  test('so many links too', async () => {
    const [id] = await database.db.selectFrom('sheet').select('id').where('owner_id', 'is', null).execute()
    const own = key()
    await database.db
      .updateTable('sheet')
      .set({ key_hash: tokenHash(own['sheet-key']) })
      .where('id', '=', id!.id)
      .execute()
    const answers: number[] = []
    while (answers.length < 70 && answers.at(-1) !== 429)
      answers.push((await visitor.ask('POST', `/api/sheets/${id!.id}/link`, { headers: own })).status)
    expect(answers.at(-1)).toBe(429)
    expect(answers.length).toBeGreaterThan(40)
    await linkTo(helper, await begin(helper, { kind: 'triage' }))
  })
})

test('my sheets: one’s own alone, the last changed first, by words of their name, a page at a time', async () => {
  const admin = await signedIn(app, 'admin')
  const list = async (query: string) =>
    SheetsPage.parse(await (await admin.get(`/api/sheets?${query}`)).json())
  expect((await list('')).sheets).toEqual([])
  for (let n = 0; n < 53; n++)
    await begin(admin, { title: `Site ${n}${n === 7 ? ' 100% off_grid' : ''}`, changedAt: at(n) })
  const first = await list('')
  expect(first.sheets.map((sheet) => sheet.title).slice(0, 2)).toEqual(['Site 52', 'Site 51'])
  const rest = await list(`after=${encodeURIComponent(first.next!)}`)
  expect([first.sheets.length, rest.sheets.length, rest.next]).toEqual([50, 3, null])
  expect(new Set([...first.sheets, ...rest.sheets].map((sheet) => sheet.id)).size).toBe(53)
  const titles = async (words: string) =>
    (await list(`q=${encodeURIComponent(words)}`)).sheets.map((sheet) => sheet.title)
  expect(await titles('OFF_grid')).toEqual(['Site 7 100% off_grid'])
  expect(await titles('%')).toEqual(['Site 7 100% off_grid'])
  expect((await list('kind=triage')).sheets).toEqual([])
  expect((await list('kind=diagnosis')).sheets).toHaveLength(50)
  expect((await admin.get('/api/sheets?after=nonsense')).status).toBe(400)

  const id = first.sheets[0]!.id
  const old = entryOf('tingle', 'no')
  await add(admin, `sheets/${id}`, [old, entryOf('tingle', 'yes', { after: [old.id] }), entryOf('wet', 'no')])
  const [row] = (await list('')).sheets.filter((sheet) => sheet.id === id)
  expect([row?.findings, row?.stops]).toEqual([2, true])
})

test('what can’t be is refused with the field at fault', async () => {
  const put = async (body: unknown) => (await tech.ask('PUT', `/api/sheets/${randomUUID()}`, { body })).status
  expect(await put(headOf({ edition: 'f'.repeat(64) }))).toBe(400)
  expect(await put({ ...headOf(), title: ' ' })).toBe(400)
  const id = await begin(tech)
  for (const entry of [
    entryOf('receptacle.hn.volts', -1),
    entryOf('receptacle.hn.volts', 1, { id: 'nonsense' }),
    entryOf('receptacle.hn.volts', 1, { deviceAt: 'yesterday' }),
    entryOf('receptacle.hn.volts', 1, { kept: 'x'.repeat(4001) }),
  ])
    expect((await add(tech, `sheets/${id}`, [entry])).status).toBe(400)
  const other = await tech.ask('PUT', `/api/sheets/${id}`, {
    body: headOf({ edition: changedEdition('Another title').hash }),
  })
  expect(other.status).toBe(409)
})

describe('live', () => {
  /** Listens as a page does; `next` waits for the next event. */
  async function follow(asker: Asker, path: string, headers = {}) {
    const answer = await asker.ask('GET', `/api/${path}/events`, { headers })
    expect(answer.headers.get('content-type')).toMatch(/^text\/event-stream/)
    const reader = answer.body!.pipeThrough(new TextDecoderStream()).getReader()
    let text = ''
    return {
      next: async (): Promise<string> => {
        for (;;) {
          const event = /event: (\w+)\ndata: .*\n\n/.exec(text)
          if (event !== null) {
            text = text.slice(event.index + event[0].length)
            return event[1]!
          }
          const { done, value } = await reader.read()
          if (done) return 'closed'
          text += value
        }
      },
      stop: () => reader.cancel(),
    }
  }

  test('a finding reaches the other with the same link at once, on another server process too', async () => {
    const second = await runApp(database.url)
    const there = await signedIn(second, 'senior')
    const id = await begin(helper, { kind: 'triage' })
    const token = await linkTo(helper, id)
    const [near, far] = [await follow(tech, `shared/${token}`), await follow(there, `shared/${token}`)]
    expect([await near.next(), await far.next()]).toEqual(['changed', 'changed'])
    const since = Date.now()
    await add(helper, `sheets/${id}`, [entryOf('tingle', 'no')])
    expect([await near.next(), await far.next()]).toEqual(['changed', 'changed'])
    expect(Date.now() - since).toBeLessThan(3000)
    expect((await open(there, `shared/${token}`)).entries).toHaveLength(1)

    await helper.ask('DELETE', `/api/sheets/${id}/link`)
    expect([await near.next(), await near.next()]).toEqual(['ended', 'closed'])
    expect(await far.next()).toBe('ended')
    await second.close()
  })

  test('ends with the session of whoever opened it, and with no other', async () => {
    const id = await begin(helper, { kind: 'triage' })
    const token = await linkTo(helper, id)
    const leaving = await signedIn(app, 'tech')
    const pages = [await follow(leaving, `shared/${token}`), await follow(tech, `shared/${token}`)] as const
    expect([await pages[0].next(), await pages[1].next()]).toEqual(['changed', 'changed'])
    await leaving.post('/api/sign-out')
    expect([await pages[0].next(), await pages[0].next()]).toEqual(['ended', 'closed'])
    await add(helper, `sheets/${id}`, [entryOf('tingle', 'no')])
    expect(await pages[1].next()).toBe('changed')
    await pages[1].stop()

    // Ended from elsewhere: a changed role ends every session.
    const own = await begin(senior)
    const page = await follow(senior, `sheets/${own}`)
    expect(await page.next()).toBe('changed')
    const again = await signedIn(app, 'senior')
    await again.post('/api/sign-out-everywhere')
    expect(await page.next()).toBe('ended')
    senior = await signedIn(app, 'senior')
  })

  test('one’s own sheet follows without a link', async () => {
    const id = await begin(tech)
    const page = await follow(tech, `sheets/${id}`)
    expect(await page.next()).toBe('changed')
    await add(tech, `sheets/${id}`, [entryOf('tingle', 'no')])
    expect(await page.next()).toBe('changed')
    await page.stop()
  })
})
