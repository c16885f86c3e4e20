/**
 * The last thing a start says.
 * @param {import('./settings.mjs').Settings} settings
 * @param {{ inboxPort?: number, paymentUrl?: string }} local the pages that show caught mail, and local payments
 * @param {string[]} accounts of the demo club, a line for each role
 */
export function welcome(settings, { inboxPort, paymentUrl }, accounts) {
  const lines = ['', `Underfoot runs at ${settings.appUrl}`]
  if (inboxPort) lines.push(`Mail is caught, not sent; it is read at http://localhost:${inboxPort}`)
  if (paymentUrl)
    lines.push(`No money moves: payments are a local service, with its own clock, at ${paymentUrl}`)
  if (accounts.length > 0) lines.push('', ...accounts)
  lines.push('', 'Ctrl-C stops it; the data stays.', '')
  return lines.join('\n')
}
