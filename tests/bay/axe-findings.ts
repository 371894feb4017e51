import axe from 'axe-core'

/** What axe finds wrong in the page as it stands. Colours are measured elsewhere: jsdom paints nothing. */
export async function axeFindings(): Promise<readonly string[]> {
  const { violations } = await axe.run(document.body, { rules: { 'color-contrast': { enabled: false } } })
  return violations.flatMap(({ id, nodes }) => nodes.map(({ html }) => `${id}: ${html}`))
}
