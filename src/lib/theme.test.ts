import { readFileSync } from 'node:fs'
import { expect, test } from 'vitest'
import { chooseTheme, chosenTheme } from './theme.ts'

test('a chosen theme is there before the first paint of the next page', () => {
  chooseTheme('dark')
  delete document.documentElement.dataset.theme
  const beforePaint = readFileSync('public/theme.js', 'utf8')
  new Function(beforePaint)()
  expect(document.documentElement.dataset.theme).toBe('dark')
})

test('the device decides until somebody chooses, and after giving the choice back', () => {
  expect(chosenTheme()).toBe('system')
  chooseTheme('light')
  expect(chosenTheme()).toBe('light')
  chooseTheme('system')
  expect(chosenTheme()).toBe('system')
})

test('a stored word that is no theme is not applied', () => {
  localStorage.setItem('underfoot-theme', 'neon')
  expect(chosenTheme()).toBe('system')
})
