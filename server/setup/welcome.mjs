/**
 * The last thing a start says.
 * @param {import('./settings.mjs').Settings} settings
 * @param {number | undefined} inboxPort of the page that shows caught mail
 * @param {string[]} accounts of the demo club, a line for each role
 */
export function welcome(settings, inboxPort, accounts) {
  const lines = ['', `Underfoot runs at ${settings.appUrl}`]
  if (inboxPort) lines.push(`Mail is caught, not sent; it is read at http://localhost:${inboxPort}`)
  if (accounts.length > 0) lines.push('', ...accounts)
  lines.push('', 'Ctrl-C stops it; the data stays.', '')
  return lines.join('\n')
}
