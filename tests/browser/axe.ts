import axe from 'axe-core'
import type { Page } from 'playwright-core'

const tags = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa', 'best-practice']

/** What axe finds on the page as it stands: one line each, empty when it finds nothing. */
export async function axeFindings(page: Page): Promise<string[]> {
  await page.evaluate(axe.source)
  const violations = await page.evaluate(
    (values) =>
      (window as unknown as { axe: typeof axe }).axe
        .run(document, { runOnly: { type: 'tag', values } })
        .then((result) =>
          result.violations.map(({ id, help, nodes }) => ({
            id,
            help,
            where: nodes.map((n) => n.target.join(' ')),
          })),
        ),
    tags,
  )
  return violations.map(({ id, help, where }) => `${id}: ${help} (${where.join('; ')})`)
}
