import axe from 'axe-core'
import type { Page } from 'playwright-core'

/** What axe finds wrong on the page as it stands (WCAG 2.2 A and AA, best practice left out), one line each; empty is good. */
export async function axeFindings(page: Page): Promise<readonly string[]> {
  // Through the debugger, not as a script element: the page's policy rightly refuses that one.
  await page.evaluate(axe.source)
  const results = await page.evaluate(async () => {
    const { axe: injected } = globalThis as unknown as { axe: typeof import('axe-core') }
    return injected.run(document, { runOnly: { type: 'tag', values: ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'] } })
  })
  return results.violations.flatMap(({ id, help, nodes }) => nodes.map((node) => `${id}: ${help}: ${node.target.join(' ')}`))
}
