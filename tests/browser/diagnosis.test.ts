import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, test } from 'vitest'
import { putInForce } from '../../server/editions/put-in-force.ts'
import { demoPerson } from '../server/asker.ts'
import { changedEdition } from '../server/some-edition.ts'
import { openBrowser, openSite, phone, visit } from './browser.ts'
import type { Site } from './browser.ts'
import { beginSheet, field, observe, openDiagnosis, ranking, read, readThree } from './diagnosis-steps.ts'
import { signInAs } from './sign-in-as.ts'

let site: Site
let browser: Browser
beforeAll(async () => {
  ;[site, browser] = await Promise.all([openSite(), openBrowser()])
})
afterAll(async () => {
  await browser.close()
  await site.close()
})

const focused = (page: Page) => page.evaluate(() => document.activeElement?.getAttribute('aria-label') ?? '')
const bondLines = (page: Page) =>
  page
    .getByRole('list', { name: 'What releases it' })
    .getByRole('listitem')
    .evaluateAll((lines) => lines.map((line) => / not met/.test(line.textContent ?? '')).map((not) => !not))

test('nothing opens before a tech is signed in; a homeowner is told who may', async () => {
  const { page, end } = await visit(browser, site)
  await page.goto('/diagnosis?sheet=anything')
  await page.getByRole('heading', { level: 1, name: 'Diagnosis is for qualified people' }).waitFor()
  const signIn = page.getByRole('main').getByRole('link', { name: 'Sign in' })
  expect(await signIn.getAttribute('href')).toBe('/sign-in?next=%2Fdiagnosis%3Fsheet%3Danything')
  await signInAs(page, 'helper')
  await page.reload()
  await page.getByText('with a homeowner’s account.').waitFor()
  expect(await signIn.count()).toBe(0)
  await openDiagnosis(page)
  await end()
})

test('a diagnosis by keyboard alone', async () => {
  const { page, complaints, strays, end } = await visit(browser, site)
  const { keyboard } = page
  const tabTo = async (matches: (html: string) => boolean) => {
    for (let i = 0; i < 60; i++) {
      const html = await page.evaluate(() => {
        const active = document.activeElement
        return active?.matches('button, input, a, [tabindex="0"]') ? active.outerHTML : ''
      })
      if (matches(html)) return
      await keyboard.press('Tab')
    }
    throw new Error('never reached by Tab')
  }
  await page.goto('/diagnosis')
  await page.getByRole('heading', { level: 1, name: 'Diagnosis is for qualified people' }).waitFor()
  await tabTo((html) => html.includes('/sign-in?next') && html.includes('btn-main'))
  await keyboard.press('Enter')
  await tabTo((html) => html.includes('autocomplete="username"'))
  await keyboard.type(demoPerson('tech').email)
  await keyboard.press('Tab')
  await keyboard.type(demoPerson('tech').password)
  await keyboard.press('Enter')
  await page.getByRole('button', { name: 'New sheet' }).waitFor()
  await tabTo((html) => html.includes('New sheet'))
  await keyboard.press('Enter')
  await page.getByLabel('Title').waitFor()
  await tabTo((html) => html.startsWith('<input') && html.includes('maxlength="80"'))
  await keyboard.type('By keyboard')
  await keyboard.press('Enter')
  await page.getByRole('heading', { name: 'Likely causes' }).waitFor()

  await keyboard.press('h')
  await keyboard.type('119.6')
  await keyboard.press('Enter')
  await keyboard.type('56.8')
  await keyboard.press('Enter')
  await keyboard.type('57.2')
  await keyboard.press('Enter')
  expect(await field(page, 'hot–neutral').inputValue()).toBe('119.6')
  expect(await field(page, 'neutral–ground').inputValue()).toBe('56.8')
  expect(await field(page, 'hot–ground').inputValue()).toBe('57.2')
  await page.getByText('The ground readings fall 5.6 V short of hot–neutral').waitFor()
  await page.getByRole('img', { name: /neutral to ground 56.8 volts/ }).waitFor()

  // After the last side no field has the cursor, so letters are keys.
  await keyboard.press('3')
  expect(await page.getByRole('button', { name: /^Panel/, pressed: true }).count()).toBe(1)
  await keyboard.press('4')
  await keyboard.press('n')
  await keyboard.press('Control+a')
  await keyboard.press('Delete')
  expect(await field(page, 'neutral–ground').inputValue()).toBe('')
  await keyboard.press('Control+z')
  await page.waitForFunction(() =>
    [...document.querySelectorAll('input')].some((one) => one.value === '56.8'),
  )
  await keyboard.press('Enter')
  await keyboard.press('Enter')

  await keyboard.press('l')
  expect(await page.evaluate(() => document.activeElement?.closest('.reading')?.textContent)).toContain(
    'loaded',
  )
  await keyboard.type('114')
  await keyboard.press('Enter')
  await keyboard.press('m')
  await keyboard.press('ArrowRight')
  await keyboard.press('Space')
  await page.getByRole('radio', { name: /Passing through/, checked: true }).waitFor()
  expect(await field(page, 'hot–neutral').inputValue()).toBe('')
  await keyboard.press('ArrowLeft')
  await keyboard.press('Space')

  await keyboard.press('c')
  const first = page.locator('[data-cause]').first()
  expect(await first.evaluate((head) => head === document.activeElement)).toBe(true)
  const last = page.locator('[data-cause]').last()
  // Ranking goes on beside the keys, and a row that has gone takes the cursor along: steady once it has ended.
  await expect
    .poll(
      async () => {
        await keyboard.press('c')
        await keyboard.press('End')
        return last.evaluate((head) => head === document.activeElement)
      },
      { timeout: 15_000 },
    )
    .toBe(true)
  expect(await last.getAttribute('aria-expanded')).toBe('false')
  await keyboard.press('Enter')
  expect(await last.getAttribute('aria-expanded')).toBe('true')
  await keyboard.press('Home')
  await keyboard.press('ArrowDown')
  expect(
    await page
      .locator('[data-cause]')
      .nth(1)
      .evaluate((head) => head === document.activeElement),
  ).toBe(true)

  await keyboard.press('s')
  await keyboard.type('tingle')
  await keyboard.press('Enter')
  await page.getByRole('radiogroup', { name: 'Tingle', exact: true }).waitFor()
  await keyboard.press('ArrowRight')
  await keyboard.press('Space')
  await page.getByRole('button', { name: 'Tingle: No. Change' }).waitFor()

  await keyboard.press('t')
  expect(await page.evaluate(() => document.activeElement?.classList.contains('next-enter'))).toBe(true)
  expect(complaints).toEqual([])
  expect(strays).toEqual([])
  await end()
})

test('letters are no keys where they are switched off', async () => {
  const { page, end } = await visit(browser, site)
  await openDiagnosis(page)
  await beginSheet(page)
  await page.getByRole('button', { name: 'Keys' }).click()
  await page.getByRole('checkbox', { name: /Single letters/ }).click()
  await page.reload()
  await page.getByRole('heading', { name: 'Likely causes' }).waitFor()
  await page.keyboard.press('h')
  expect(await page.evaluate(() => document.activeElement?.tagName)).toBe('BODY')
  await end()
})

describe('nothing typed is lost', () => {
  test('a reload keeps the sheet, and Undo still goes back', async () => {
    const { page, end } = await visit(browser, site)
    await openDiagnosis(page)
    await beginSheet(page, { title: 'Ferrin cabin' })
    await readThree(page, '119.6', '56.8', '57.2')
    await observe(page, 'plug-in', 'Plug-in GFCI test', 'Does not trip')
    const before = await ranking(page)
    await page.reload()
    await page.getByRole('heading', { level: 1, name: 'Ferrin cabin' }).waitFor()
    expect(await field(page, 'hot–ground').inputValue()).toBe('57.2')
    await page.getByRole('button', { name: 'Plug-in GFCI test: Does not trip. Change' }).waitFor()
    expect(await ranking(page)).toEqual(before)
    await page.getByRole('button', { name: /^Undo/ }).click()
    expect(await page.getByRole('button', { name: /Plug-in GFCI test: Does not trip/ }).count()).toBe(0)
    await page.getByRole('button', { name: /^Undo/ }).click()
    expect(await field(page, 'hot–ground').inputValue()).toBe('')
    await end()
  })

  test('with the server gone it goes on ranking', async () => {
    const own = await openSite()
    const { page, end } = await visit(browser, own)
    await openDiagnosis(page)
    await beginSheet(page)
    await own.stop()
    const before = await ranking(page)
    await readThree(page, '119.6', '56.8', '57.2')
    await page.waitForFunction(
      (first) => document.querySelector('[data-cause]')?.textContent !== first,
      before[0],
    )
    expect((await ranking(page))[0]).not.toBe(before[0])
    await end()
    await own.close()
  })

  test('a number with a comma counts; one that is none stays, with a sentence, and the rest is ranked', async () => {
    const { page, end } = await visit(browser, site)
    await openDiagnosis(page)
    await beginSheet(page)
    await readThree(page, '119,6', '56,8', '57,2')
    await page.getByText('fall 5.6 V short').waitFor()
    await read(page, 'hot–ground', '57v')
    await page.getByText('Hot–ground must be a number.').waitFor()
    expect(await field(page, 'hot–ground').inputValue()).toBe('57v')
    await page.getByText('One entry can’t be read and is left out of the ranking until mended.').waitFor()
    expect(await page.locator('[data-cause]').count()).toBeGreaterThan(0)
    await page.getByText('An entry can’t be read. It is mended first.').waitFor()
    await end()
  })

  test('beyond 2.5 × nominal it is asked what was meant, and what was typed stays until answered', async () => {
    const { page, end } = await visit(browser, site)
    await openDiagnosis(page)
    await beginSheet(page)
    await read(page, 'hot–ground', '572')
    await page.getByText('Over 300 V on a 120 V system.').waitFor()
    expect(await field(page, 'hot–ground').inputValue()).toBe('572')
    await page.getByRole('button', { name: 'Meant 57.2?' }).click()
    expect(await field(page, 'hot–ground').inputValue()).toBe('57.2')
    expect(await page.getByText('Over 300 V on a 120 V system.').count()).toBe(0)
    await end()
  })

  test('Backspace in an empty field removes the reading; the toast brings it back', async () => {
    const { page, end } = await visit(browser, site)
    await openDiagnosis(page)
    await beginSheet(page)
    await read(page, 'hot–neutral', '119.6')
    await page.getByText('More on hot–neutral').click()
    await page.getByRole('button', { name: 'Note' }).click()
    await page.getByLabel('Note on Hot–neutral').fill('fridge running')
    await field(page, 'hot–neutral').fill('')
    await page.keyboard.press('Backspace')
    await page.getByText('Hot–neutral removed').waitFor()
    expect(await page.getByText('fridge running').count()).toBe(0)
    await page.getByRole('status').getByRole('button', { name: 'Undo' }).click()
    await page.getByText('fridge running').waitFor()
    await end()
  })
})

test('an unsteady reading takes two numbers, and is drawn at their middle', async () => {
  const { page, end } = await visit(browser, site)
  await openDiagnosis(page)
  await beginSheet(page)
  await readThree(page, '120', '60', '40')
  await page.getByText('More on hot–ground').click()
  await page.getByRole('button', { name: 'Unsteady' }).click()
  await page.keyboard.type('80')
  await page.keyboard.press('Enter')
  expect(await page.getByRole('textbox', { name: 'hot–ground, wanders up to' }).inputValue()).toBe('80')
  await page.getByText('wanders · no load').waitFor()
  await page.getByText('Ground sits halfway, and stays there against this meter.').waitFor()
  await page.getByText(/ghost or firm is still open/).waitFor()
  await page.getByRole('button', { name: 'Unsteady', pressed: true }).click()
  expect(await page.getByRole('textbox', { name: /wanders up to/ }).count()).toBe(0)
  await end()
})

describe('a stop', () => {
  test('stands first, as an alert, and sends nobody back to the reading', async () => {
    const { page, end } = await visit(browser, site)
    await openDiagnosis(page)
    await beginSheet(page)
    await readThree(page, '121', '119', '118')
    const alert = page.getByRole('alert', { name: 'Danger: stop' })
    await alert.getByRole('heading', { name: 'Neutral or metal is live. Stop.' }).waitFor()
    expect(await alert.innerText()).toContain(
      'It may be a ghost; treat it as live until a low-resistance meter or the test bulb says otherwise.',
    )
    expect(
      await page.locator('.desk-right').evaluate((column) => column.firstElementChild?.getAttribute('role')),
    ).toBe('alert')
    expect(await page.getByRole('button', { name: /^Take again/ }).count()).toBe(0)
    await page.getByText('Not before what the danger panel says has been done and proved.').waitFor()
    // Under a low-resistance meter it is no ghost.
    await page.getByRole('button', { name: 'Change', exact: true }).click()
    await page.getByRole('radio', { name: /^Low/ }).click()
    await page.getByLabel('Low input resistance, in ohms').fill('3000')
    await page.waitForFunction(
      () => !document.querySelector('[role=alert]')?.textContent?.includes('may be a ghost'),
    )
    await alert.waitFor()
    await end()
  })

  test('on a phone it comes before the readings, and the dock covers none of it', async () => {
    const { page, end } = await visit(browser, site, { size: phone })
    await openDiagnosis(page)
    await beginSheet(page)
    await observe(page, 'tingle', 'Tingle', 'Yes')
    const [stop, ground] = await Promise.all(
      ['.stop-panel', '.desk-ground'].map((part) => page.locator(part).boundingBox()),
    )
    expect((stop?.y ?? 0) + (stop?.height ?? 0)).toBeLessThanOrEqual(ground?.y ?? 0)
    expect(await page.locator('.desk-dock').evaluate((dock) => getComputedStyle(dock).position)).toBe(
      'static',
    )
    await end()
  })
})

test('where no single cause fits there is no verdict, and the reading to take again is named', async () => {
  const { page, end } = await visit(browser, site)
  await openDiagnosis(page)
  await beginSheet(page)
  await read(page, 'hot–neutral', '119.6')
  await page.keyboard.press('l')
  await page.keyboard.type('131')
  await page.keyboard.press('Enter')
  await page.getByRole('heading', { name: 'As computed, no verdict' }).waitFor()
  await page.getByText('More volts with the load on than off at the receptacle.').waitFor()
  expect(await page.getByRole('heading', { name: 'Likely causes' }).count()).toBe(0)
  expect(await page.getByText(/One cause explains all/).count()).toBe(0)
  expect(await page.locator('[data-cause][aria-expanded=true]').count()).toBe(0)
  await page
    .getByText('No single cause fits. Take again: Hot–neutral, loaded', { exact: false })
    .waitFor({ state: 'attached' })
  await page.getByRole('button', { name: /^Take again: Hot–neutral, loaded/ }).click()
  expect(await page.evaluate(() => (document.activeElement as HTMLInputElement).value)).toBe('131')
  await end()
})

describe('installing a bond', () => {
  const bulb = async (page: Page, ng: string, hg: string) => {
    await page.getByRole('button', { name: 'Enter for line 1' }).click()
    await page.keyboard.type(ng)
    await page.keyboard.press('Enter')
    await page.keyboard.type(hg)
    await page.keyboard.press('Enter')
  }

  test('is held back until all five lines hold, and then released in one line', async () => {
    const { page, end } = await visit(browser, site)
    await openDiagnosis(page)
    await beginSheet(page)
    await readThree(page, '119.6', '56.8', '57.2')
    await page.getByRole('heading', { name: 'Held back: installing a bond' }).waitFor()
    await expect.poll(() => bondLines(page)).toEqual([false, false, false, false, true])
    await bulb(page, '0.3', '0.4')
    await page.getByRole('button', { name: 'Enter for line 2' }).click()
    await page.keyboard.type('118')
    await page.keyboard.press('Enter')
    await page.getByRole('button', { name: 'Enter for line 3' }).click()
    await page
      .getByRole('radiogroup', { name: 'Bulb proved', exact: true })
      .getByRole('radio', { name: 'Yes' })
      .click()
    await page.getByRole('button', { name: 'Enter for line 3' }).waitFor({ state: 'detached' })
    await expect.poll(() => bondLines(page)).toEqual([true, true, true, false, true])
    await page.getByRole('button', { name: 'Enter for line 4' }).click()
    await page.getByRole('radio', { name: 'Forbid it' }).click()
    expect(await page.getByRole('heading', { name: /released/ }).count()).toBe(0)
    await page.getByRole('radio', { name: 'Allow or require it' }).click()
    await page.getByRole('heading', { name: 'Installing a bond: released' }).waitFor()
    await page.getByText('Test bulb 0.3 and 0.4 V across it, on battery').waitFor()

    // One sign of a tie already there, in another mode, and it is never.
    await page.getByRole('radio', { name: /Passing through/ }).click()
    await page.getByRole('button', { name: /^Receptacle/ }).click()
    await readThree(page, '120', '0.2', '119.9')
    await page
      .getByText(/Never while this stands. At the receptacle ground holds on one of the two wires/)
      .waitFor()
    await end()
  })

  test('values that are only tried release nothing', async () => {
    const { page, end } = await visit(browser, site)
    await openDiagnosis(page)
    await beginSheet(page)
    await observe(page, 'bulb proved', 'Bulb proved', 'Yes')
    await observe(page, 'instructions', 'Instructions on a bond', 'Allow or require it')
    await page.getByRole('button', { name: 'What if' }).click()
    await bulb(page, '0.3', '0.4')
    await page.getByRole('button', { name: 'Enter for line 2' }).click()
    await page.keyboard.type('118')
    await page.keyboard.press('Enter')
    await page.getByText('Values that are only tried release nothing.').waitFor()
    await expect.poll(() => bondLines(page)).toEqual([true, true, true, true, true])
    await page.getByRole('button', { name: 'Drop' }).click()
    await page.waitForFunction(() => document.querySelectorAll('.bond-line').length === 5)
    expect(await page.getByRole('heading', { name: /released/ }).count()).toBe(0)
    expect(await field(page, 'Source bulb N–G').inputValue()).toBe('')
    await page.getByRole('button', { name: /^Undo/ }).click()
    await page.getByRole('button', { name: 'Keep' }).click()
    await page.getByRole('heading', { name: 'Installing a bond: released' }).waitFor()
    await end()
  })
})

test('the next test is entered from its plate, can be put aside, and others can be taken', async () => {
  const { page, end } = await visit(browser, site)
  await openDiagnosis(page)
  await beginSheet(page)
  const title = () => page.locator('#next-title').innerText()
  const first = await title()
  await page.getByRole('button', { name: 'Why this one' }).click()
  await page.getByText(/bits in \d+ min/).waitFor()
  await page.getByRole('button', { name: 'Put aside' }).click()
  await page.waitForFunction((was) => document.querySelector('#next-title')?.textContent !== was, first)
  await page.getByRole('button', { name: /^Other tests/ }).click()
  await page.getByRole('list', { name: 'Tests put aside' }).getByText(first).waitFor()
  await page
    .getByRole('button', { name: /^Show all/ })
    .first()
    .click()
  await page
    .getByRole('button', { name: 'Take this one: Three readings at the panel’s buses', exact: true })
    .click()
  await page.waitForFunction(() =>
    document.querySelector('#next-title')?.textContent?.includes('panel’s buses'),
  )
  await page.getByText('Cover off, live: qualified only').first().waitFor()
  await page.getByRole('button', { name: 'Enter the panel’s three volts' }).click()
  expect(await page.getByRole('button', { name: /^Panel/, pressed: true }).count()).toBe(1)
  expect(await focused(page)).toBe('')
  await page.keyboard.type('119')
  expect(await field(page, 'hot–neutral').inputValue()).toBe('119')
  await end()
})

test('what stands first is announced once, after the last key', async () => {
  const { page, end } = await visit(browser, site)
  await openDiagnosis(page)
  await beginSheet(page)
  await readThree(page, '119.6', '59.8', '59.9')
  const said = page.getByText(/^First now: .+, \d+ percent$/)
  await said.waitFor({ state: 'attached' })
  const [first] = await ranking(page)
  expect(first?.toLowerCase()).toContain((await said.innerText()).slice(11, 20).toLowerCase())
  await end()
})

test('on a phone our own pad rises, goes from side to side, and can change its hand', async () => {
  const { page, end } = await visit(browser, site, { size: phone, touch: true })
  await openDiagnosis(page)
  await beginSheet(page)
  const pad = page.getByRole('group', { name: /^Number pad/ })
  const keys = async (text: string) => {
    for (const key of text) await pad.getByRole('button', { name: key, exact: true }).tap()
  }
  await field(page, 'hot–neutral').tap()
  expect(await field(page, 'hot–neutral').getAttribute('inputmode')).toBe('none')
  await keys('119.6')
  await pad.getByRole('button', { name: 'Next side' }).tap()
  await keys('56.8')
  await pad.getByRole('button', { name: 'Next side' }).tap()
  await keys('57')
  await pad.getByRole('button', { name: 'Unsteady' }).tap()
  await keys('58')
  const boxes = await Promise.all([field(page, 'hot–ground').boundingBox(), pad.boundingBox()])
  expect((boxes[0]?.y ?? 0) + (boxes[0]?.height ?? 0)).toBeLessThanOrEqual(boxes[1]?.y ?? 0)
  await pad.getByRole('button', { name: /at the left/ }).tap()
  await pad.getByRole('button', { name: 'Done', exact: true }).tap()
  await pad.waitFor({ state: 'detached' })
  expect(await page.getByRole('textbox', { name: 'hot–ground, wanders up to' }).inputValue()).toBe('58')
  await page.getByText(/fall 5.3 V short/).waitFor()
  await field(page, 'hot–neutral').tap()
  await pad.getByRole('button', { name: /at the right/ }).waitFor()
  await pad.getByRole('button', { name: 'Can’t reach' }).tap()
  await page.getByText('can’t be reached').waitFor()
  await end()
})

test('sheets on this device are listed, copied, and removed with a way back', async () => {
  const { page, end } = await visit(browser, site)
  await openDiagnosis(page)
  await beginSheet(page, { title: 'First cabin' })
  await readThree(page, '120', '0.2', '119.9')
  await page.getByRole('link', { name: 'All sheets on this device' }).click()
  const list = page.getByRole('list', { name: 'Sheets on this device' })
  await list.getByText('3 findings').waitFor()
  await page.getByRole('button', { name: 'Copy First cabin' }).click()
  await list.getByRole('link', { name: 'First cabin, copy' }).waitFor()
  await page.getByRole('button', { name: 'Remove First cabin', exact: true }).click()
  await list.getByRole('link', { name: 'First cabin', exact: true }).waitFor({ state: 'detached' })
  await page.getByRole('button', { name: 'Undo' }).click()
  await list.getByRole('link', { name: 'First cabin', exact: true }).click()
  expect(await field(page, 'neutral–ground').inputValue()).toBe('0.2')
  await end()
})

test('a sheet stays on the edition it was begun with', async () => {
  const own = await openSite()
  const { page, end } = await visit(browser, own)
  await openDiagnosis(page)
  await beginSheet(page)
  await page.getByText('Edition 1').waitFor()
  // A sheet's edition opens later only if its files lie on the device, which they do once the page was idle.
  await page.waitForFunction(
    () =>
      new Promise<boolean>((resolve) => {
        const asked = indexedDB.open('tracelamp')
        asked.onsuccess = () => {
          const got = asked.result.transaction('settings').objectStore('settings').get('editionInForce')
          got.onsuccess = () => {
            asked.result.close()
            resolve(got.result !== undefined)
          }
        }
      }),
  )
  await putInForce(own.database.db, changedEdition('Another title'), { note: 'second', reason: 'test' })
  await page
    .getByRole('button', { name: /edition/i })
    .first()
    .click()
  await page.getByRole('link', { name: 'All sheets on this device' }).click()
  await page.getByRole('link', { name: 'Cabin' }).click()
  await page.getByRole('heading', { name: 'Likely causes' }).waitFor()
  expect(await page.locator('.desk-head .stamp').innerText()).toContain('Edition 1')
  await page.getByRole('link', { name: 'All sheets on this device' }).click()
  await beginSheet(page, { title: 'Second cabin' })
  expect(await page.locator('.desk-head .stamp').innerText()).toContain('Edition 2')
  await end()
  await own.close()
})
