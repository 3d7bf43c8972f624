import type { Browser } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, test } from 'vitest'
import { axeFindings } from './axe.ts'
import { openBrowser, openSite, phone, settled, visit } from './browser.ts'
import type { Site, Theme } from './browser.ts'
import { answerAllNo, choose, chosenIn, tickAll } from './check-steps.ts'

let site: Site
let browser: Browser
beforeAll(async () => {
  ;[site, browser] = await Promise.all([openSite(), openBrowser()])
})
afterAll(async () => {
  await browser.close()
  await site.close()
})

describe('one yes stops', () => {
  test('at once, with what to do first; then it is asked which, and only that is recorded', async () => {
    const { page, complaints, end } = await visit(browser, site, { size: phone, touch: true })
    await page.goto('/check/1')
    await settled(page)
    await page
      .getByRole('radiogroup', { name: /shock or a tingle/ })
      .getByRole('radio', { name: 'Yes' })
      .click()
    await page.waitForURL('**/check/stop')
    const danger = page.getByRole('alert')
    expect(await danger.innerText()).toContain('DANGER')
    expect(await danger.getByRole('heading', { level: 1 }).innerText()).toBe('Someone had a shock. Stop.')
    // Nothing stands above the danger panel in the page's content.
    expect(
      await page.getByRole('main').evaluate((main) => main.firstElementChild?.getAttribute('role')),
    ).toBe('alert')

    await page.getByRole('radio', { name: 'A tingle' }).click()
    await page.getByRole('heading', { level: 1, name: 'Metal here may shock you. Stop.' }).waitFor()
    const said = await page.getByRole('blockquote').innerText()
    expect(said).toContain('Someone felt a tingle from metal.')
    expect(said).not.toContain('shock')
    expect(complaints).toEqual([])
    await end()
  })

  test('no share, no cause, no measuring and nothing that implies all is well', async () => {
    const { page, end } = await visit(browser, site)
    await answerAllNo(page)
    await page
      .getByRole('radiogroup', { name: /water near/ })
      .getByRole('radio', { name: 'Yes' })
      .click()
    await page.waitForURL('**/check/stop')
    const words = await page.getByRole('main').innerText()
    expect(words).not.toMatch(/%|percent|\bsafe\b/i)
    await page.getByRole('button', { name: 'It’s off now' }).click()
    await page.getByText('You said: it’s off.').waitFor()
    expect(await page.getByRole('main').innerText()).toContain(
      'Off is not proved. Stay away from the metal until a professional has tested it.',
    )
    expect(await page.getByRole('blockquote').innerText()).toContain('I have switched it off.')
    for (const step of ['/check/4', '/check/5']) {
      await page.goto(step)
      await page.waitForURL('**/check/stop')
    }
    await page.goto('/check/result')
    await page.getByRole('alert').getByText('DANGER').waitFor()
    expect(await page.getByRole('heading', { name: 'What fits' }).count()).toBe(0)
    await end()
  })

  test('carbon monoxide: everyone out, and "it’s off" is not offered', async () => {
    const { page, end } = await visit(browser, site)
    await page.goto('/check/1')
    await page
      .getByRole('radiogroup', { name: /headache/ })
      .getByRole('radio', { name: 'Yes' })
      .click()
    await page.getByRole('button', { name: 'Everyone is out now' }).waitFor()
    expect(await page.getByRole('button', { name: 'It’s off now' }).count()).toBe(0)
    await end()
  })

  test('from the front page’s bar in one press, with words that need no answer', async () => {
    const { page, end } = await visit(browser, site, { size: phone, touch: true })
    await page.goto('/')
    await page.getByRole('link', { name: /What to do now/ }).click()
    await page.getByRole('heading', { level: 1, name: 'Stop. Keep away from it.' }).waitFor()
    await page.getByRole('radio', { name: 'A battery is hot, swollen or hissing.' }).click()
    await page.getByRole('heading', { level: 1, name: 'The battery may burn. Leave now.' }).waitFor()
    await end()
  })

  test('a little warm is a caution: that circuit off, and the questions go on', async () => {
    const { page, end } = await visit(browser, site)
    await answerAllNo(page)
    await page
      .getByRole('radiogroup', { name: /hot, scorched/ })
      .getByRole('radio', { name: 'Yes' })
      .click()
    await page.getByRole('heading', { name: 'Hot or scorched. Stop.' }).waitFor()
    await page.getByRole('radio', { name: 'Only a little warm, no buzz' }).click()
    await page.getByRole('heading', { name: 'Switch that circuit off, and leave it off' }).waitFor()
    await page.getByRole('link', { name: 'Go on with the questions' }).click()
    await page.getByRole('button', { name: 'Next: what feeds it' }).click()
    await page.waitForURL('**/check/2')
    await end()
  })

  test('volts that stop, stop at once', async () => {
    const { page, end } = await visit(browser, site)
    await answerAllNo(page)
    await page.goto('/check/5')
    await settled(page)
    await page.getByRole('radio', { name: 'Yes, I have' }).click()
    await tickAll(page)
    const fields = page.getByRole('textbox')
    await fields.nth(0).fill('119')
    await fields.nth(1).fill('118')
    await page.keyboard.press('Enter')
    await page.getByRole('heading', { level: 1, name: 'Neutral or metal is live. Stop.' }).waitFor()
    await end()
  })
})

describe('volts', () => {
  test('are shut until a meter is known and all five are ticked, and a likely slip is asked about', async () => {
    const { page, end } = await visit(browser, site)
    await answerAllNo(page)
    await page.goto('/check/5')
    await page.getByText('only if you have used a meter').first().waitFor()
    await page.getByRole('radio', { name: 'Yes, I have' }).click()
    const boxes = page.getByRole('checkbox')
    for (let i = 0; i < 4; i += 1) await boxes.nth(i).click()
    expect(await page.getByRole('textbox').count()).toBe(0)
    await boxes.nth(4).click()
    const hotNeutral = page.getByRole('textbox').first()
    await hotNeutral.fill('1196')
    await page.keyboard.press('Enter')
    await page.getByRole('button', { name: 'Meant 119.6?' }).click()
    expect(await hotNeutral.inputValue()).toBe('119.6')
    await page.getByRole('textbox').nth(1).fill('about 3')
    await page.keyboard.press('Enter')
    await page.getByText('Type a number of volts, such as 119.6.').waitFor()
    expect(await page.getByRole('textbox').nth(1).inputValue()).toBe('about 3')
    await end()
  })

  test('with our own pad on a phone: 64 px keys, focus stays in the field', async () => {
    const { page, end } = await visit(browser, site, { size: phone, touch: true })
    await answerAllNo(page)
    await page.goto('/check/5')
    await page.getByRole('radio', { name: 'Yes, I have' }).tap()
    await tickAll(page)
    const hotNeutral = page.getByRole('textbox').first()
    await hotNeutral.tap()
    const pad = page.getByRole('group', { name: 'Number pad for hot–neutral' })
    for (const key of ['1', '1', '9', '.', '6'])
      await pad.getByRole('button', { name: key, exact: true }).tap()
    expect(await hotNeutral.inputValue()).toBe('119.6')
    expect(await hotNeutral.evaluate((input) => input === document.activeElement)).toBe(true)
    for (const key of await pad.getByRole('button', { name: /^[0-9.]$/ }).all()) {
      const box = await key.boundingBox()
      expect(Math.min(box?.width ?? 0, box?.height ?? 0)).toBeGreaterThanOrEqual(64)
    }
    await pad.getByRole('button', { name: 'Next side' }).tap()
    await page.getByRole('group', { name: 'Number pad for neutral–ground' }).waitFor()
    await page.getByRole('button', { name: 'Can’t reach' }).tap()
    await page
      .getByRole('group', { name: 'Number pad for hot–ground' })
      .getByRole('button', { name: 'Done', exact: true })
      .tap()
    await page.getByRole('button', { name: 'Next: what it may be' }).waitFor()
    await end()
  })
})

describe('nothing is lost', () => {
  test('a reload keeps every answer, and the masthead says where they lie', async () => {
    const { page, end } = await visit(browser, site)
    await answerAllNo(page)
    await page.getByText('On this device only: 1').waitFor()
    await page.goto('/check/2')
    await choose(page, 'What feeds it?', /An engine generator/)
    await page.goto('/check/3')
    await page.getByRole('textbox').fill('kitchen, left of the sink')
    await choose(page, 'When did it begin?', 'After a storm')
    await page.goto('/check/4')
    await choose(page, /hot and neutral/, 'Lit')
    await page.getByRole('button', { name: /across neutral and ground: not answered/ }).click()
    await page.getByRole('button', { name: /across neutral and ground: lit/ }).click()
    await page.getByRole('button', { name: /across neutral and ground: dim/ }).waitFor()
    await page.reload()
    expect(await chosenIn(page, 'Tester lamp across hot and neutral')).toBe('Lit')
    expect(await chosenIn(page, 'Tester lamp across neutral and ground')).toBe('Dim')
    await page.goto('/check/3')
    expect(await page.getByRole('textbox').inputValue()).toBe('kitchen, left of the sink')
    expect(await chosenIn(page, 'When did it begin?')).toBe('After a storm')
    await page.goto('/check/2')
    expect(await chosenIn(page, 'What feeds it?')).toContain('An engine generator')
    await end()
  })

  test('a step left out, and answers removed, come back with Undo', async () => {
    const { page, end } = await visit(browser, site)
    await answerAllNo(page)
    await page.goto('/check/4')
    await choose(page, /hot and ground/, 'Dark')
    await page.getByRole('button', { name: 'Not sure? Skip' }).click()
    await page.waitForURL('**/check/5')
    await page.getByRole('button', { name: 'Undo' }).click()
    await page.getByRole('link', { name: 'Back' }).click()
    await page
      .getByRole('radiogroup', { name: /hot and ground/ })
      .getByRole('radio', { name: 'Dark', checked: true })
      .waitFor()

    await page.goto('/check/1')
    await page.getByRole('button', { name: 'Start again with no answers' }).click()
    await page.getByText('Eight questions are still open.').waitFor()
    await page.getByRole('button', { name: 'Undo' }).click()
    await page.getByRole('button', { name: 'Next: what feeds it', disabled: false }).waitFor()
    await page.reload()
    expect(await chosenIn(page, 'Is there water near it?')).toBe('No')
    await end()
  })

  test('with the server stopped after the first page came, the check goes through to its result', async () => {
    const own = await openSite()
    const { page, complaints, end } = await visit(browser, own)
    await page.goto('/')
    await settled(page)
    await own.stop()
    await page.getByRole('link', { name: 'Check my power', exact: true }).last().click()
    const questions = page.getByRole('main').getByRole('listitem')
    await questions.first().waitFor()
    for (let i = 0; i < 8; i += 1)
      await questions.nth(i).getByRole('radio', { name: 'No', exact: true }).click()
    await page.getByRole('button', { name: 'Next: what feeds it' }).click()
    await page.getByRole('radio', { name: /A hard-wired inverter/ }).click()
    await page.getByRole('button', { name: 'Next: what you notice' }).click()
    await page.getByRole('radio', { name: 'Everything' }).click()
    await page.getByRole('button', { name: 'Next: tester lamps' }).click()
    for (const [pair, state] of [
      ['hot and neutral', 'Lit'],
      ['neutral and ground', 'Dim'],
      ['hot and ground', 'Dim'],
    ] as const)
      await page.getByRole('radiogroup', { name: pair }).getByRole('radio', { name: state }).click()
    await page.getByRole('button', { name: 'Next: used a meter before?' }).click()
    await page.getByRole('radio', { name: 'No. Skip' }).click()
    await page.getByRole('heading', { name: /What fits|It may be/ }).waitFor()
    const words = await page.getByRole('main').innerText()
    expect(words).not.toMatch(/%|percent|\bsafe\b/i)
    expect(words).toContain('Edition 1. A guide, not an inspection.')
    // The line to the server is down, and the browser says so; nothing else may fail.
    expect(
      complaints.filter(
        (line) => !/ERR_CONNECTION_REFUSED|ERR_INCOMPLETE|Failed to load resource/.test(line),
      ),
    ).toEqual([])
    await end()
    await own.close()
  })
})

test('a browser that keeps nothing says so, and the check goes on', async () => {
  const { page, end } = await visit(browser, site)
  await page.addInitScript(() => {
    IDBFactory.prototype.open = () => {
      throw new DOMException('not here', 'SecurityError')
    }
  })
  await answerAllNo(page)
  await page.getByText('This device can’t keep your answers.').waitFor()
  await page.getByRole('button', { name: 'Next: what feeds it' }).click()
  await page.getByRole('heading', { level: 1, name: 'What feeds it?' }).waitFor()
  await end()
})

describe.each(['light', 'dark'] as const)('in the %s theme axe finds nothing', (theme: Theme) => {
  test.each(['/check/1', '/check/2', '/check/3', '/check/4', '/check/5', '/check/result', '/check/stop'])(
    'on %s, and nothing leaves the origin',
    async (path) => {
      const { page, complaints, strays, end } = await visit(browser, site, {
        theme,
        size: phone,
        touch: true,
      })
      await answerAllNo(page)
      if (path === '/check/result') {
        await page.goto('/check/4')
        await choose(page, /hot and neutral/, 'Lit')
        await choose(page, /hot and ground/, 'Dark')
        await choose(page, /neutral and ground/, 'Lit')
      }
      await page.goto(path)
      await settled(page)
      if (path === '/check/5') {
        await page.getByRole('radio', { name: 'Yes, I have' }).tap()
        await tickAll(page)
      }
      if (path === '/check/result')
        await page
          .getByRole('heading', { name: /What fits|It may be/ })
          .first()
          .waitFor()
      expect(await axeFindings(page)).toEqual([])
      expect(complaints).toEqual([])
      expect(strays).toEqual([])
      // 320 px is the narrowest: nothing scrolls sideways.
      await page.setViewportSize({ width: 320, height: 700 })
      expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBeLessThanOrEqual(320)
      await end()
    },
  )
  test('on a stop', async () => {
    const { page, end } = await visit(browser, site, { theme, size: phone })
    await page.goto('/check/1')
    await page
      .getByRole('radiogroup', { name: /shock or a tingle/ })
      .getByRole('radio', { name: 'Yes' })
      .click()
    await page.getByRole('heading', { level: 1, name: /Stop/ }).waitFor()
    expect(await axeFindings(page)).toEqual([])
    await end()
  })
})
