/**
 * The last thing a start says.
 * @param {import('./settings.mjs').Settings} settings
 * @param {number | undefined} mailPort of the page that shows caught mail
 * @param {string} accounts of the demo, as its own command lists them
 */
export function welcome(settings, mailPort, accounts) {
  const lines = ['', `Underfoot runs at ${settings.appUrl}`]
  if (mailPort) lines.push(`Mail is caught, not sent; read it at http://localhost:${mailPort}`)
  if (accounts) lines.push('', accounts)
  lines.push('', 'Ctrl-C stops it; the data stays.', '')
  return lines.join('\n')
}
