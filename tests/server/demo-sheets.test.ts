import { afterAll, beforeAll, expect, test } from 'vitest'
import { openEdition } from '../../rules/edition/open.ts'
import { openFile } from '../../server/editions/editions.queries.ts'
import { seedStarter } from '../../server/editions/seed-starter.ts'
import { seedDemoPeople } from '../../server/people/demo-people.ts'
import { resultOf } from '../../server/sheets/compute-result.ts'
import demoSheets from '../../server/sheets/demo-sheets.json' with { type: 'json' }
import { seedDemoSheets, shutDemoLinks } from '../../server/sheets/demo-sheets.ts'
import { SheetOpened, SheetsPage } from '../../server/sheets/sheets.contract.ts'
import { Asker, signedIn } from './asker.ts'
import { testDatabase } from './database.ts'
import type { TestDatabase } from './database.ts'
import { runApp } from './running-app.ts'
import type { RunningApp } from './running-app.ts'

let database: TestDatabase
let app: RunningApp
beforeAll(async () => {
  database = await testDatabase()
  await seedStarter(database.db)
  await seedDemoPeople(database.db)
  // Each start makes them anew, and changes nothing.
  await seedDemoSheets(database.db)
  await seedDemoSheets(database.db)
  app = await runApp(database.url)
})
afterAll(async () => {
  await app.close()
  await database.close()
})

const link = demoSheets.flatMap((sheet) => sheet.link ?? [])[0]!

test.each(['helper', 'tech'] as const)(
  'a demo %s has sheets, with results that the edition gives',
  async (role) => {
    const asker = await signedIn(app, role)
    const { sheets } = SheetsPage.parse(await (await asker.get('/api/sheets')).json())
    expect(sheets.map((sheet) => sheet.title).sort()).toEqual(
      demoSheets
        .filter((sheet) => sheet.by === role)
        .map((sheet) => sheet.title)
        .sort(),
    )
    const edition = openEdition(await openFile(database.db, 1, 'diagnosis'))
    for (const { id } of sheets) {
      const opened = SheetOpened.parse(await (await asker.get(`/api/sheets/${id}`)).json())
      expect(opened.result).toEqual(await resultOf(edition, opened.edition, opened.context, opened.entries))
      // Every finding of it is one the edition can read, or the bond's answer would say so by itself.
      expect(opened.entries.length).toBeGreaterThan(2)
    }
  },
)

test('what they show: a stop, swapped wires, halves against ground', async () => {
  const first = async (role: 'helper' | 'tech', words: RegExp) => {
    const asker = await signedIn(app, role)
    const { sheets } = SheetsPage.parse(await (await asker.get('/api/sheets')).json())
    const id = sheets.find((sheet) => words.test(sheet.title))!.id
    return SheetOpened.parse(await (await asker.get(`/api/sheets/${id}`)).json()).result!
  }
  expect((await first('helper', /Porch/)).stops).toContain('tingle')
  expect((await first('tech', /Orchard/)).ranking[0]!.cause).toBe('reversed-polarity')
  expect((await first('helper', /Kitchen/)).bond).toBe('held-back')
})

test('the demo link opens for a tech, and for nobody where others reach the server', async () => {
  const tech = await signedIn(app, 'tech')
  expect((await tech.get(`/api/shared/${link}`)).status).toBe(200)
  await shutDemoLinks(database.db)
  for (const asker of [tech, new Asker(app)])
    expect((await asker.get(`/api/shared/${link}`)).status).toBe(404)
})
