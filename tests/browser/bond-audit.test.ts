import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, test } from 'vitest'
import { auditAddress, auditPath, readSystem } from '../../rules/bond-audit/address.ts'
import { arrangements } from '../../rules/bond-audit/arrangements.ts'
import type { System } from '../../rules/bond-audit/system.ts'
import { axeFindings } from './axe.ts'
import { desk, openBrowser, openSite, phone, settled, visit } from './browser.ts'
import type { Site } from './browser.ts'

let site: Site
let browser: Browser
beforeAll(async () => {
  ;[site, browser] = await Promise.all([openSite(), openBrowser()])
})
afterAll(async () => {
  await browser.close()
  await site.close()
})

const startOf = (id: string): System => {
  const start = arrangements.find((one) => one.id === id)
  if (start === undefined) throw new Error(`no arrangement ${id}`)
  return start.system
}
const open = async (page: Page, id: string) => {
  await page.goto(auditAddress(startOf(id)))
  await page.getByRole('heading', { name: 'As it stands' }).waitFor()
}
/** A mode's row. */
const mode = (page: Page, name: string) =>
  page.getByRole('listitem').filter({ has: page.getByRole('heading', { level: 3, name, exact: true }) })
/** The system in the address, once the page has written it. */
const written = async (page: Page, is: (system: System) => boolean): Promise<void> => {
  await page.waitForURL((url) => {
    const system = readSystem(url.searchParams.get('system') ?? '')
    return system !== undefined && is(system)
  })
}

describe.each(['light', 'dark'] as const)('the bond audit, %s', (theme) => {
  test.each([
    ['phone', phone],
    ['desk', desk],
  ] as const)('on a %s: axe finds nothing, all opened; nothing scrolls sideways', async (_, size) => {
    const { page, complaints, strays, end } = await visit(browser, site, {
      theme,
      size,
      touch: size === phone,
    })
    await page.goto(auditPath)
    await page.getByRole('heading', { name: 'Start from a common arrangement' }).waitFor()
    expect(await axeFindings(page)).toEqual([])
    for (const id of ['inlet-generator', 'balanced-panel', 'old-outbuilding']) {
      await open(page, id)
      for (const button of await page
        .getByRole('button', { name: /^Change / })
        .all()
        .then((all) => all.slice(-2, -1)))
        await button.click()
      await page.evaluate(() => {
        for (const one of document.querySelectorAll('details')) one.open = true
      })
      expect(await axeFindings(page)).toEqual([])
      expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBeLessThanOrEqual(size.width)
    }
    expect(complaints).toEqual([])
    expect(strays).toEqual([])
    await end()
  })
})

test('at 320 px nothing scrolls sideways, and every target is 44 px high or more', async () => {
  const { page, end } = await visit(browser, site, { size: { width: 320, height: 700 }, touch: true })
  await open(page, 'three-sources')
  await page.evaluate(() => {
    for (const one of document.querySelectorAll('details')) one.open = true
  })
  expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBeLessThanOrEqual(320)
  const targets = await page
    .locator('main')
    .locator('a:visible, button:visible, input:visible, select:visible, summary:visible')
    .all()
  expect(targets.length).toBeGreaterThan(20)
  for (const target of targets) {
    const box = await target.boundingBox()
    const name = await target.evaluate((one) => one.outerHTML.slice(0, 80))
    if (box !== null) expect({ name, high: box.height >= 44 }).toEqual({ name, high: true })
  }
  await end()
})

test('every mode of a filled-in address with its count; a mode taken away has none', async () => {
  const { page, end } = await visit(browser, site)
  await open(page, 'inlet-generator')
  expect(await page.title()).toBe('Bond audit: Portable generator on an inlet · Tracelamp')
  await expectText(mode(page, 'On utility'), /Bonds: 1.*Passes\. One bond: the bond screw in Main panel/)
  await expectText(mode(page, 'On utility, Generator plugged in'), /Bonds: 2.*Fails\. Two bonds\./)
  await expectText(mode(page, 'On generator'), /With 12 A running, 6\.0 A returns on the ground wire/)

  await page.getByRole('button', { name: 'Change Interlocked breakers' }).click()
  await page
    .getByRole('group', { name: 'Input 2' })
    .getByLabel('By', { exact: true })
    .selectOption('taken-away')
  await expectText(mode(page, 'On generator'), /Mode taken away.*No bond is counted/)
  expect(await mode(page, 'On generator').innerText()).not.toMatch(/\d/)
  await page.getByText('1 of 1 mode passes').first().waitFor()
  await end()
})
const expectText = async (row: ReturnType<typeof mode>, text: RegExp) => {
  await expect.poll(async () => (await row.innerText()).replace(/\s+/g, ' ')).toMatch(text)
}

test('by keyboard alone: a start, a bond taken out, kept in the address and on the device', async () => {
  const { page, end } = await visit(browser, site)
  await page.goto(auditPath)
  const start = page.getByRole('button', { name: /^Subpanel with its screw left in/ })
  await start.focus()
  await page.keyboard.press('Enter')
  await expectText(mode(page, 'On utility'), /Bonds: 2/)
  await page.getByText('take the bond screw or strap out. Keep neutrals').last().waitFor()

  const garage = page.getByRole('radiogroup', { name: 'Garage panel' })
  await garage.getByRole('radio', { name: 'Bond', exact: true }).focus()
  await page.keyboard.press('ArrowRight')
  await page.keyboard.press('Space')
  await expectText(mode(page, 'On utility'), /Bonds: 1 .*Passes/)
  expect(await garage.getByRole('radio', { name: 'No bond' }).getAttribute('aria-checked')).toBe('true')

  const out = (system: System) =>
    system.parts.some((part) => part.id === 'garage-panel' && part.kind === 'panel' && !part.bond)
  await written(page, out)
  await page.reload()
  await expectText(mode(page, 'On utility'), /Bonds: 1 .*Passes/)
  await page.goto(auditPath)
  await expectText(mode(page, 'On utility'), /Bonds: 1 .*Passes/)
  await end()
})

test('parts are added, named and removed; Undo brings one back; what can’t be is said beside its field', async () => {
  const { page, end } = await visit(browser, site)
  await open(page, 'subpanel')
  await page.getByRole('button', { name: 'Source, panel or rod' }).click()
  await page.getByRole('button', { name: 'Panel', exact: true }).click()
  const name = page.getByLabel('Name', { exact: true })
  await name.fill('Main panel')
  await page.getByText('Another part has this name.').first().waitFor()
  expect(await page.getByRole('heading', { name: 'As it stands' }).count()).toBe(0)
  await name.fill('')
  await page.getByText('Give it a name.').waitFor()
  expect(await name.inputValue()).toBe('')
  await name.fill('Shop panel')
  await page.getByRole('heading', { name: 'As it stands' }).waitFor()
  await page.getByText('Length and wire sizes are known').click()
  const length = page.getByLabel('Length one way, ft')
  await length.fill('forty')
  await page.getByText('A number from 0 to 5,000.').waitFor()
  expect(await length.inputValue()).toBe('forty')
  await length.fill('40')
  await written(page, ({ parts }) =>
    parts.some((part) => part.kind === 'panel' && part.feed.run?.length === 40),
  )

  await page.getByRole('button', { name: 'Remove Shop panel' }).click()
  await written(page, ({ parts }) => !parts.some((part) => part.name === 'Shop panel'))
  await page.getByRole('button', { name: 'Undo' }).click()
  await written(page, ({ parts }) => parts.some((part) => part.name === 'Shop panel'))
  await end()
})

test('a balanced output is warned of, and nothing on the page tells to bond it', async () => {
  const { page, end } = await visit(browser, site)
  await open(page, 'balanced-panel')
  await page.evaluate(() => {
    for (const one of document.querySelectorAll('details')) one.open = true
  })
  const says = await page.locator('.audit-result').innerText()
  expect(says).toContain('Never bond a balanced output.')
  expect(says).not.toMatch(/put the bond|one bond here|turn its own bond relay on|have it bonded/i)
  await page
    .getByRole('radiogroup', { name: 'Van panel' })
    .getByRole('radio', { name: 'Bond', exact: true })
    .click()
  await page.getByText('A bond ties a balanced output to ground.').waitFor()
  await end()
})

test('a damaged address is said, and what the device kept is shown', async () => {
  const { page, end } = await visit(browser, site)
  await page.goto(auditPath)
  await page.getByRole('button', { name: /^Cabin on one inverter/ }).click()
  await written(page, ({ parts }) => parts.length > 0)
  await page.goto(`${auditPath}?system=1~cut`)
  await page.getByText('This address holds no system that can be read.').waitFor()
  await expectText(mode(page, 'On battery'), /Bonds: 2/)
  await end()
})

test('with no network the page opens and audits', async () => {
  const own = await openSite()
  const { page, end } = await visit(browser, own, { worker: true })
  await page.goto('/')
  await page.evaluate(() => navigator.serviceWorker.ready.then(() => undefined))
  await settled(page)
  await own.stop()
  await open(page, 'two-inverters')
  await expectText(mode(page, 'On Inverter A and Inverter B'), /Bonds: 2/)
  await page.getByText('the one bond then goes into House panel').waitFor()
  await page.getByText('Installing a bond is held back.').waitFor()
  await end()
  await own.close()
})
