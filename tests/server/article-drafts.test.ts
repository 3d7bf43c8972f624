/** Articles written, put in force, withdrawn: over HTTP, with two seniors at once. */
import { sql } from 'kysely'
import { afterAll, beforeAll, describe, expect, test } from 'vitest'
import { ArticlesFound } from '../../server/articles/articles.contract.ts'
import {
  ArticleInForce,
  Draft,
  DraftList,
  Revision,
  RevisionList,
} from '../../server/articles/drafts.contract.ts'
import type { DraftText } from '../../server/articles/drafts.contract.ts'
import { Feedback } from '../../server/articles/feedback.contract.ts'
import { EditionInForce, EditionList } from '../../server/editions/editions.contract.ts'
import { seedStarter } from '../../server/editions/seed-starter.ts'
import { seedDemoPeople } from '../../server/people/demo-people.ts'
import { ArticlesFile } from '../../rules/edition/schema.ts'
import type { Article } from '../../rules/edition/schema.ts'
import { Asker, signedIn } from './asker.ts'
import { testDatabase } from './database.ts'
import type { TestDatabase } from './database.ts'
import { runApp } from './running-app.ts'
import type { RunningApp } from './running-app.ts'
import { starterBytes } from './some-edition.ts'
import { until } from './until.ts'

let database: TestDatabase
let app: RunningApp
let senior: Asker
/** A second one who may write, at another desk. */
let admin: Asker
let tech: Asker
let visitor: Asker
let homeowner: Asker
beforeAll(async () => {
  database = await testDatabase()
  await seedStarter(database.db)
  await seedDemoPeople(database.db)
  app = await runApp(database.url)
  senior = await signedIn(app, 'senior')
  admin = await signedIn(app, 'admin')
  tech = await signedIn(app, 'tech')
  visitor = new Asker(app)
  homeowner = await signedIn(app, 'helper')
})
afterAll(async () => {
  await app.close()
  await database.close()
})

const at = (slug: string, rest = '') => `/api/article-drafts/${slug}${rest}`
const read = async (asker: Asker, slug: string) => Draft.parse(await (await asker.get(at(slug))).json())
const save = (asker: Asker, slug: string, version: string, text: DraftText, more: object = {}) =>
  asker.ask('PUT', at(slug), { body: { version, ...text, ...more } })
const saved = async (answer: Response) => {
  expect(answer.status).toBe(200)
  return Draft.parse(await answer.json())
}
const putInForce = (asker: Asker, slug: string, version: string, reason = 'Clearer words') =>
  asker.ask('PUT', at(slug, '/in-force'), { body: { version, reason } })
const revisions = async (slug: string) =>
  RevisionList.parse(await (await senior.get(at(slug, '/revisions'))).json()).revisions
const problem = async (answer: Response) =>
  (await answer.json()) as { title: string; errors?: Record<string, string>; theirs?: unknown }
const inForce = async () => EditionInForce.parse(await (await tech.get('/api/edition')).json())
async function served(asker: Asker, slug: string): Promise<Article | undefined> {
  const { files } = EditionInForce.parse(await (await asker.get('/api/edition')).json())
  const shelves = await Promise.all(
    files
      .filter((file) => file.name.startsWith('articles-'))
      .map(async ({ hash }) =>
        ArticlesFile.parse(await (await asker.get(`/api/edition-files/${hash}`)).json()),
      ),
  )
  return shelves.flatMap((shelf) => shelf.articles).find((article) => article.slug === slug)
}
const withBody = (text: DraftText, body: string): DraftText => ({ ...text, body })
const withLine = (text: DraftText, line: string) => withBody(text, `${text.body}\n\n${line}`)
const changedBy = async (asker: Asker, slug: string, line: string) => {
  const before = await read(asker, slug)
  return saved(await save(asker, slug, before.version, withLine(before.text!, line)))
}

describe('a draft', () => {
  test('begins with the text in force, is kept, and changes nothing that is served', async () => {
    const before = await read(senior, 'open-ground')
    expect(before).toMatchObject({ pending: false, edited: null, overtaken: false, inForce: { edition: 1 } })
    expect(before.text).toEqual(before.inForce?.text)
    const kept = await saved(
      await save(senior, 'open-ground', before.version, withLine(before.text!, 'A line more.')),
    )
    expect(kept).toMatchObject({ pending: true, edited: { by: 'Demo senior tech' } })
    expect((await read(admin, 'open-ground')).text?.body).toMatch(/A line more\.$/)
    expect((await inForce()).hash).toBe(starterBytes.hash)
    expect((await served(visitor, 'open-ground'))?.body).not.toContain('A line more.')
  })

  test('saved second is refused with the other text, and both are still there', async () => {
    const seen = await read(senior, 'long-run')
    const first = await saved(
      await save(senior, 'long-run', seen.version, withLine(seen.text!, 'By the first.')),
    )
    const refused = await save(admin, 'long-run', seen.version, withLine(seen.text!, 'By the second.'))
    expect(refused.status).toBe(409)
    const { title, theirs } = await problem(refused)
    expect(title).toBe('Demo senior tech changed this article meanwhile.')
    expect(Draft.parse(theirs)).toEqual(first)
    const both = await saved(
      await save(admin, 'long-run', first.version, withLine(first.text!, 'By the second.')),
    )
    expect(both.text?.body).toMatch(/By the first\.\n\nBy the second\.$/)
    const [former] = await revisions('long-run')
    expect(former).toMatchObject({ author: 'Demo senior tech', edition: null })
  })

  test('saved by two at the same moment is kept once', async () => {
    const seen = await read(senior, 'backfeed')
    const answers = await Promise.all(
      [senior, admin, senior, admin, senior].map((asker, n) =>
        save(asker, 'backfeed', seen.version, withLine(seen.text!, `Line ${n}.`)),
      ),
    )
    expect(answers.map((answer) => answer.status).sort()).toEqual([200, 409, 409, 409, 409])
  })

  test('of one sitting is one revision; what is brought back replaces nothing for good', async () => {
    let draft = await read(senior, 'loose-hot')
    const original = draft.text!
    for (const line of ['One.', 'One. Two.', 'One. Two. Three.'])
      draft = await saved(await save(senior, 'loose-hot', draft.version, withLine(original, line)))
    expect(await revisions('loose-hot')).toEqual([])
    draft = await saved(await save(admin, 'loose-hot', draft.version, withLine(original, 'By another.')))
    const [first, ...others] = await revisions('loose-hot')
    expect(others).toEqual([])
    const former = Revision.parse(
      await (await senior.get(at('loose-hot', `/revisions/${first!.number}`))).json(),
    )
    expect(former.body).toMatch(/One\. Two\. Three\.$/)
    const { number, ...text } = former
    draft = await saved(await save(senior, 'loose-hot', draft.version, text, { restores: number }))
    expect(draft.text).toEqual(text)
    const all = await revisions('loose-hot')
    expect(all.map((one) => [one.number, one.author])).toEqual([
      [2, 'Demo admin'],
      [1, 'Demo senior tech'],
    ])
    expect((await save(senior, 'loose-hot', draft.version, text, { restores: 9 })).status).toBe(404)
    const gone = await senior.post(at('loose-hot', '/let-go'), { version: draft.version })
    expect(await saved(gone)).toMatchObject({ pending: false, text: original })
    expect((await revisions('loose-hot'))[0]).toMatchObject({ reason: 'Draft let go' })
  })

  test('may be unfinished, but not of the wrong shape or size', async () => {
    const seen = await read(senior, 'open-hot')
    const { text, version } = seen
    const heads = [
      { audience: 'nobody' },
      { reviewed: '2026-02-30' },
      { causes: ['../x'] },
      { title: 'x'.repeat(201) },
    ]
    for (const wrong of heads) {
      const answer = await save(senior, 'open-hot', version, {
        ...text!,
        head: { ...text!.head, ...wrong } as never,
      })
      expect([wrong, answer.status]).toEqual([wrong, 400])
      expect(Object.keys((await problem(answer)).errors!)[0]).toMatch(/^head\./)
    }
    expect((await save(senior, 'open-hot', version, withBody(text!, 'é'.repeat(100_001)))).status).toBe(400)
    expect((await save(senior, 'open-hot', version, withBody(text!, 'a\u0000b'))).status).toBe(400)
    expect((await save(senior, 'open-hot', version, withBody(text!, 'x'.repeat(700_000)))).status).toBe(413)
    await saved(await save(senior, 'open-hot', version, withBody(text!, 'é'.repeat(100_000))))
    for (const slug of ['new', 'Upper', 'a b', '..']) {
      const answer = await save(senior, encodeURIComponent(slug), '0-new', text!)
      expect([slug, answer.status]).toEqual([slug, 404])
    }
  })
})

describe('put in force', () => {
  test('a draft is a new edition that every process tells of, and its other files stay the same', async () => {
    const before = await inForce()
    const draft = await changedBy(senior, 'open-neutral', 'A sentence that is new.')
    const answer = await putInForce(senior, 'open-neutral', draft.version, 'A reader asked for it')
    expect(answer.status).toBe(200)
    const done = ArticleInForce.parse(await answer.json())
    expect(done.draft).toMatchObject({ pending: false, overtaken: false, inForce: { edition: done.edition } })
    await until(() => (app.feed.current?.number === done.edition ? true : undefined))
    const after = await inForce()
    expect(after.number).toBe(done.edition)
    expect((await served(tech, 'open-neutral'))?.body).toMatch(/A sentence that is new\.$/)
    const changed = after.files.filter((file) => !before.files.some((one) => one.hash === file.hash))
    expect(changed.map((file) => file.name)).toEqual(['articles-everyone'])
    expect(after.counts).toEqual(before.counts)

    const kept = await revisions('open-neutral')
    expect(kept.map((one) => [one.author, one.reason, one.edition])).toEqual([
      ['Demo senior tech', 'A reader asked for it', done.edition],
      [null, 'As it was in edition 1', 1],
    ])
    const reasons = await database.db
      .selectFrom('edition_in_force')
      .select('reason')
      .orderBy('id', 'desc')
      .execute()
    expect(reasons[0]?.reason).toBe('A reader asked for it')
    expect((await putInForce(senior, 'open-neutral', done.draft.version)).status).toBe(409)
    // The program's next start leaves it in force.
    await seedStarter(database.db)
    expect((await inForce()).number).toBe(done.edition)
  })

  test('a new article is found, and shown only to its audience; no list names one for qualified people', async () => {
    const { text } = await read(senior, 'double-bond')
    const title = 'Zephyr clamp on the quixotic bus'
    const words: DraftText = { ...text!, head: { ...text!.head, title } }
    const draft = await saved(await save(senior, 'zephyr-clamp', '0-new', words))
    const listed = async () =>
      DraftList.parse(await (await senior.get('/api/article-drafts')).json()).articles.find(
        (one) => one.slug === 'zephyr-clamp',
      )
    expect(await listed()).toMatchObject({ inForce: false, pending: true, title })
    expect((await putInForce(senior, 'zephyr-clamp', draft.version)).status).toBe(200)
    expect(await listed()).toMatchObject({ inForce: true, pending: false })
    const hits = async (asker: Asker) =>
      ArticlesFound.parse(await (await asker.get('/api/articles?q=zephyr')).json()).hits.map((hit) => hit.id)
    expect(await hits(tech)).toEqual(['zephyr-clamp'])
    expect(await hits(visitor)).toEqual([])
    expect(await served(visitor, 'zephyr-clamp')).toBeUndefined()
    const list = await (await visitor.get('/api/editions')).text()
    expect(EditionList.parse(JSON.parse(list)).editions[0]?.note).toBe(
      'An article for qualified people added',
    )
    expect(list).not.toMatch(/zephyr/i)
    expect(await (await visitor.get('/api/edition')).text()).not.toMatch(/zephyr/i)
  })

  test('what is unfinished, leads nowhere, warns of nothing or promises too much is refused, field by field', async () => {
    const seen = await read(senior, 'sound')
    let { version } = seen
    const text = seen.text!
    const refusedFor = async (wrong: DraftText) => {
      version = (await saved(await save(senior, 'sound', version, wrong))).version
      const answer = await putInForce(senior, 'sound', version)
      expect(answer.status).toBe(400)
      return (await problem(answer)).errors
    }
    const head = (change: Partial<DraftText['head']>) => ({ ...text, head: { ...text.head, ...change } })
    const number = (await inForce()).number
    expect(Object.keys((await refusedFor(head({ title: ' ', sources: [], reviewed: '' })))!).sort()).toEqual([
      'reviewed',
      'sources',
      'title',
    ])
    expect(await refusedFor(head({ title: '' }))).toEqual({ title: 'Give it a title.' })
    expect(await refusedFor(head({ causes: ['no-such-cause'] }))).toEqual({
      causes: 'No such cause: no-such-cause.',
    })
    expect(await refusedFor(head({ tests: ['no-such-test'] }))).toEqual({
      tests: 'No such test: no-such-test.',
    })
    expect(Object.keys((await refusedFor(head({ dueForReview: '2020-01-01' })))!)).toEqual(['dueForReview'])
    const body = async (words: string) => (await refusedFor(withBody(text, words)))?.['body']
    expect(await body(`${text.body}\n\nSee [that](/tests/no-such-test).`)).toMatch(/\/tests\/no-such-test/)
    expect(await body('Words alone.')).toMatch(/what can hurt/)
    expect(await body(`${text.body}\n\nThen it is safe to touch.`)).toMatch(/what was measured/)
    expect(await body('')).toBeTruthy()
    expect((await putInForce(senior, 'sound', version, ' ')).status).toBe(400)
    expect((await inForce()).number).toBe(number)
  })

  test('is refused when another text of it came into force meanwhile, until the writer has seen that', async () => {
    const draft = await changedBy(senior, 'two-hots', 'From my draft.')
    // As a newer program would: another edition, past the drafts.
    const { changeArticles } = await import('../../server/editions/change-articles.ts')
    await database.db.transaction().execute((tx) =>
      changeArticles(tx, ({ articles }) => ({
        articles: articles.map((one) =>
          one.slug === 'two-hots' ? { ...one, body: `${one.body}\n\nNewer.` } : one,
        ),
        note: 'another',
        reason: 'test',
      })),
    )
    const refused = await putInForce(senior, 'two-hots', draft.version)
    expect(refused.status).toBe(409)
    const theirs = Draft.parse((await problem(refused)).theirs)
    expect(theirs).toMatchObject({ pending: true, overtaken: true })
    expect(theirs.inForce?.text.body).toMatch(/Newer\.$/)
    const merged = withBody(theirs.text!, `${theirs.inForce!.text.body}\n\nFrom my draft.`)
    expect((await save(senior, 'two-hots', theirs.version, merged, { onto: 'stale' })).status).toBe(409)
    const again = await saved(
      await save(senior, 'two-hots', theirs.version, merged, { onto: theirs.inForce!.hash }),
    )
    expect(again.overtaken).toBe(false)
    expect((await putInForce(senior, 'two-hots', again.version)).status).toBe(200)
    expect((await served(tech, 'two-hots'))?.body).toMatch(/Newer\.\n\nFrom my draft\.$/)
  })

  test('two at once: one edition, and the other is told', async () => {
    const draft = await changedBy(senior, 'source-off', 'Once.')
    const number = (await inForce()).number
    const answers = await Promise.all(
      [senior, admin, senior].map((asker) => putInForce(asker, 'source-off', draft.version)),
    )
    expect(answers.map((answer) => answer.status).sort()).toEqual([200, 409, 409])
    expect((await inForce()).number).toBe(number + 1)
  })

  test('two articles at the same moment: an edition each, and the later holds both', async () => {
    const [one, two] = await Promise.all([
      changedBy(senior, 'shared-neutral-lost', 'From the senior.'),
      changedBy(admin, 'low-source-voltage', 'From the admin.'),
    ])
    const { number } = await inForce()
    const answers = await Promise.all([
      putInForce(senior, 'shared-neutral-lost', one.version),
      putInForce(admin, 'low-source-voltage', two.version),
    ])
    const editions = await Promise.all(
      answers.map(async (answer) => ArticleInForce.parse(await answer.json()).edition),
    )
    expect(editions.sort((a, b) => a - b)).toEqual([number + 1, number + 2])
    expect((await served(tech, 'shared-neutral-lost'))?.body).toMatch(/From the senior\.$/)
    expect((await served(tech, 'low-source-voltage'))?.body).toMatch(/From the admin\.$/)
  })

  test('what fails half way leaves nothing: no edition, no revision, and the draft as it was', async () => {
    const draft = await changedBy(senior, 'high-source-voltage', 'Never in force.')
    const state = async () => ({
      inForce: await inForce(),
      draft: await read(senior, 'high-source-voltage'),
      revisions: await revisions('high-source-voltage'),
      editions: EditionList.parse(await (await tech.get('/api/editions')).json()),
    })
    const before = await state()
    // The last step of all: the edition is kept and in force by then, and so is the revision.
    await sql`
      create function fail_half_way() returns trigger language plpgsql as
      $$ begin raise exception 'half way'; end $$
    `.execute(database.db)
    await sql`
      create trigger fail_half_way before update on article_draft
      for each row when (old.slug = 'high-source-voltage') execute function fail_half_way()
    `.execute(database.db)
    expect((await putInForce(senior, 'high-source-voltage', draft.version)).status).toBe(500)
    expect(await state()).toEqual(before)
    await sql`drop trigger fail_half_way on article_draft`.execute(database.db)
    expect((await putInForce(senior, 'high-source-voltage', draft.version)).status).toBe(200)
    expect((await served(tech, 'high-source-voltage'))?.body).toMatch(/Never in force\.$/)
  })
})

describe('a former edition’s file for everyone', () => {
  const fileHash = async () => (await inForce()).files.find((file) => file.name === 'articles-everyone')!.hash
  const statuses = (hash: string) =>
    Promise.all(
      [visitor, homeowner, tech, senior].map(
        async (asker) => (await asker.get(`/api/edition-files/${hash}`)).status,
      ),
    )

  test('is served on while all that stands in it still is for everyone', async () => {
    const former = await fileHash()
    const draft = await changedBy(senior, 'long-run', 'Another line.')
    expect((await putInForce(senior, 'long-run', draft.version)).status).toBe(200)
    expect(await fileHash()).not.toBe(former)
    expect(await statuses(former)).toEqual([200, 200, 200, 200])
  })

  test('is for qualified people alone once an article of it is', async () => {
    const former = await fileHash()
    const holds = async (hash: string) =>
      (await (await visitor.get(`/api/edition-files/${hash}`)).text()).includes('"slug":"backfeed"')
    expect(await holds(former)).toBe(true)
    const seen = await read(senior, 'backfeed')
    const head = { ...seen.text!.head, audience: 'qualified' as const }
    const draft = await saved(await save(senior, 'backfeed', seen.version, { ...seen.text!, head }))
    expect((await putInForce(senior, 'backfeed', draft.version)).status).toBe(200)
    expect(await statuses(former)).toEqual([401, 403, 200, 200])
    const theirs = await tech.get(`/api/edition-files/${former}`)
    expect(theirs.headers.get('cache-control')).toBe('private, no-store')
    expect(await statuses(await fileHash())).toEqual([200, 200, 200, 200])
    expect(await holds(await fileHash())).toBe(false)
    expect(await holds(former)).toBe(false)
    // Back with everyone, the former file says nothing that everyone may not read.
    const again = await read(senior, 'backfeed')
    const back = await saved(
      await save(senior, 'backfeed', again.version, {
        ...again.text!,
        head: { ...head, audience: 'everyone' },
      }),
    )
    expect((await putInForce(senior, 'backfeed', back.version)).status).toBe(200)
    expect(await statuses(former)).toEqual([200, 200, 200, 200])
  })

  test('and once one of it is withdrawn, because there it stands without a mark', async () => {
    const former = await fileHash()
    const withdraw = (withdrawn: boolean) =>
      senior.ask('PUT', at('open-neutral', '/withdrawn'), { body: { withdrawn, reason: 'A test' } })
    expect((await withdraw(true)).status).toBe(200)
    expect(await statuses(former)).toEqual([401, 403, 200, 200])
    expect(await served(visitor, 'open-neutral')).toHaveProperty('withdrawn')
    expect((await withdraw(false)).status).toBe(200)
    expect(await statuses(former)).toEqual([200, 200, 200, 200])
  })
})

describe('withdrawn', () => {
  test('an article stays readable by its link, is found nowhere, and comes back', async () => {
    const draft = await changedBy(senior, 'loose-neutral', 'Waiting.')
    const before = await inForce()
    const withdraw = (body: object) => senior.ask('PUT', at('loose-neutral', '/withdrawn'), { body })
    expect(
      (await withdraw({ withdrawn: true, reason: 'Wrong figure', replacedBy: 'nothing-there' })).status,
    ).toBe(400)
    expect(
      (await withdraw({ withdrawn: true, reason: 'Wrong figure', replacedBy: 'loose-neutral' })).status,
    ).toBe(400)
    const answer = await withdraw({ withdrawn: true, reason: 'Wrong figure', replacedBy: 'open-neutral' })
    expect(answer.status).toBe(200)
    expect(await served(visitor, 'loose-neutral')).toMatchObject({
      withdrawn: new Date().toISOString().slice(0, 10),
      replacedBy: 'open-neutral',
    })
    const found = async () =>
      ArticlesFound.parse(await (await visitor.get('/api/articles?q=loose neutral')).json()).hits.some(
        (hit) => hit.kind === 'article' && hit.id === 'loose-neutral',
      )
    expect(await found()).toBe(false)
    expect((await inForce()).counts.articles).toBe(before.counts.articles - 1)
    // The draft is as it was; put in force, it is still withdrawn.
    const now = await read(senior, 'loose-neutral')
    expect(now).toMatchObject({ version: draft.version, pending: true, overtaken: false })
    expect((await putInForce(senior, 'loose-neutral', now.version)).status).toBe(200)
    expect(await served(visitor, 'loose-neutral')).toMatchObject({ replacedBy: 'open-neutral' })
    expect((await withdraw({ withdrawn: false, reason: 'Figure mended' })).status).toBe(200)
    const back = await served(visitor, 'loose-neutral')
    expect(back?.withdrawn ?? back?.replacedBy).toBeUndefined()
    expect(back?.body).toMatch(/Waiting\.$/)
    expect(await found()).toBe(true)
    expect((await revisions('loose-neutral')).map((one) => one.reason)).toEqual([
      'In force again: Figure mended',
      'Clearer words',
      'Withdrawn: Wrong figure',
    ])
  })
})

describe('whether it helped', () => {
  test('readers say, and a senior reads what they said', async () => {
    const edition = (await inForce()).number
    const say = (asker: Asker, body: object) => asker.post('/api/articles/high-source-voltage/feedback', body)
    expect((await say(visitor, { edition, helped: true })).status).toBe(201)
    expect((await say(tech, { edition, helped: false, why: ' Says nothing of 240 V. ' })).status).toBe(201)
    expect((await say(visitor, { edition, helped: false, why: 'x'.repeat(501) })).status).toBe(400)
    expect((await say(visitor, { edition: 999_999, helped: true })).status).toBe(404)
    expect((await say(visitor, { helped: true })).status).toBe(400)
    const said = Feedback.parse(await (await senior.get(at('high-source-voltage', '/feedback'))).json())
    expect(said).toMatchObject({ helped: 1, not: 1 })
    expect(said.said).toMatchObject([{ edition, why: 'Says nothing of 240 V.', by: 'Demo tech' }])
    const answers: number[] = []
    for (let n = 0; n < 20; n++) answers.push((await say(visitor, { edition, helped: true })).status)
    expect(answers).toContain(429)
    expect(answers[0]).toBe(201)
  })
})

test('a revision is never changed or deleted', async () => {
  for (const change of [
    sql`update article_revision set body = 'x'`,
    sql`delete from article_revision`,
    sql`truncate article_revision`,
  ])
    await expect(change.execute(database.db)).rejects.toThrow(/never changed or deleted/)
})
