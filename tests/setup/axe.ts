import axe from 'axe-core'
import { expect } from 'vitest'

/**
 * Accessibility faults that can be told without layout: names, roles, labels, structure. Contrast needs a browser
 * and is measured there.
 */
export async function expectNoAxeFaults(root: Element = document.body) {
  const { violations } = await axe.run(root, { rules: { 'color-contrast': { enabled: false } } })
  const faults = violations.map(({ id, nodes }) => `${id}: ${nodes.map(({ html }) => html).join(' | ')}`)
  expect(faults).toEqual([])
}
