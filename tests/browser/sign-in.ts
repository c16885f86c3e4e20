import type { Page } from 'playwright-core'
import { builtPassword } from '../../seed/builders/person.ts'

/** Signs a built person in by the form, and waits for their first page. */
export async function signIn(page: Page, email: string): Promise<void> {
  await page.goto('/sign-in')
  await page.getByLabel('E-mail address').fill(email)
  await page.getByLabel('Password', { exact: true }).fill(builtPassword)
  await page.getByRole('button', { name: 'Sign in' }).click()
  await page.getByRole('button', { name: 'Sign out' }).waitFor()
}
