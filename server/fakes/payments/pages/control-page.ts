import type { Books } from '../books.ts'
import { day, note, page } from './html.ts'

const moves = [
  ['1', 'a day'],
  ['3', 'three days'],
  ['15', 'fifteen days'],
  ['31', 'a month'],
  ['366', 'a year'],
] as const

/** The clock that moves on, and failures on demand. */
export function controlPage(books: Books, said?: string): string {
  const { state } = books
  const rows = Object.values(state.subscriptions).map(
    ({ id, customer, status, items }) =>
      `<tr><td>${id}</td><td>${customer}</td><td>${status}</td><td>${items.data[0]?.quantity} seats until ${day(items.data[0]?.current_period_end ?? 0)}</td></tr>`,
  )
  const buttons = moves.map(([days, words]) => `<button name="days" value="${days}">${words}</button>`)
  return page(
    'Local payment service',
    `${note(said)}
<p>Its clock shows ${day(books.now())} UTC. Undelivered events: ${state.undelivered.length}.</p>
<form method="post" action="/control/advance">Move the clock on by ${buttons.join(' ')}</form>
<form method="post" action="/control/fault">Let the next call
<button name="kind" value="error">fail with a 500</button> <button name="kind" value="time-out">never be answered</button></form>
<form method="post" action="/control/delivery">Events: <button name="how" value="hold">hold</button>
<button name="how" value="send">send</button> <button name="how" value="reversed">send in reverse order</button>
<button name="how" value="twice">send twice from now on</button> <button name="how" value="once">send once again</button></form>
<table><tbody>${rows.join('')}</tbody></table>`,
  )
}
