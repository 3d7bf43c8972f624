import type { Page } from 'playwright-core'

/** Chooses an answer and waits until it is drawn: by then it lies on the device. */
export async function choose(page: Page, group: string | RegExp, answer: string | RegExp): Promise<void> {
  const radio = page.getByRole('radiogroup', { name: group }).getByRole('radio', { name: answer })
  await radio.click()
  await radio.and(page.getByRole('radio', { checked: true })).waitFor()
}

/** Opens step 1 and answers no to every question about danger. */
export async function answerAllNo(page: Page): Promise<void> {
  await page.goto('/check/1')
  const groups = page.getByRole('radiogroup')
  await groups.first().waitFor()
  const answers = page.getByRole('radio', { name: 'No', exact: true })
  for (const no of await answers.all()) await no.click()
  await page.getByRole('button', { name: 'Next: what feeds it', disabled: false }).waitFor()
}

/** Ticks the five conditions of step 5. */
export async function tickAll(page: Page): Promise<void> {
  const boxes = page.getByRole('checkbox')
  await boxes.first().waitFor()
  for (const box of await boxes.all()) await box.click()
  await page.getByRole('textbox').first().waitFor()
}

/** The chosen answer of a radio group, by its name. */
export async function chosenIn(page: Page, group: string): Promise<string> {
  return (
    await page.getByRole('radiogroup', { name: group }).getByRole('radio', { checked: true }).innerText()
  ).trim()
}
