import { memo } from 'react'
import type { Analysis } from '../../../shared/contracts/trials.ts'
import { catalogue } from '../../../shared/mechanics/catalogue.ts'
import { Sheet } from '../../components/sheet.tsx'
import { formatUncertainty } from '../../lib/format-figure.ts'
import { formatSigned } from '../../lib/format-signed.ts'
import { phaseWords } from './event-words.ts'
import { Was } from './was.tsx'
import './impulse-ledger.css'

type Ledger = NonNullable<Analysis['ledger']>

const { display } = catalogue.closingBalance

/** The momentum account of a trial: opening balance, an entry a phase, running balance, closing balance. */
export const ImpulseLedger = memo(function ImpulseLedger({
  ledger,
  saved,
}: {
  ledger: Ledger
  saved?: Ledger | null | undefined
}) {
  const figure = (newtonSeconds: number) => formatSigned(newtonSeconds, display.decimals)
  const was = (read: (from: Ledger) => number | undefined, now: number) => {
    const before = saved ? read(saved) : undefined
    return <Was saved={before === undefined ? undefined : figure(before)} now={figure(now)} />
  }
  return (
    <Sheet title="Impulse ledger">
      <table className="ledger">
        <caption className="sr-only">
          Net impulse of each phase and the balance after it, in {display.unit}
        </caption>
        <thead>
          <tr>
            <th scope="col">{display.unit}</th>
            <th scope="col">impulse</th>
            <th scope="col">balance</th>
          </tr>
        </thead>
        <tbody>
          <tr>
            <th scope="row">{fell(ledger) ? 'Opening, on the box' : 'Opening, standing still'}</th>
            <td />
            <td>0</td>
          </tr>
          {ledger.entries.map((entry, i) => (
            <tr key={i}>
              <th scope="row">{entryWords(ledger.entries, i)}</th>
              <td>
                {figure(entry.netImpulse)}
                {was(({ entries }) => entries[i]?.netImpulse, entry.netImpulse)}
              </td>
              <td>
                {figure(entry.balance)}
                {was(({ entries }) => entries[i]?.balance, entry.balance)}
              </td>
            </tr>
          ))}
        </tbody>
        <tfoot>
          <tr>
            <th scope="row">{closesAtRest(ledger) ? 'Closing, standing still' : 'Closing, still moving'}</th>
            <td />
            <td>
              {figure(ledger.closing.value)}
              {was(({ closing }) => closing.value, ledger.closing.value)}
            </td>
          </tr>
        </tfoot>
      </table>
      <p className="pt-2 text-small text-ink-2">{closingSentence(ledger)}</p>
    </Sheet>
  )
})

const fell = ({ entries }: Ledger) => entries[0]?.phase === 'arrival'

/** An account that can be tested ends at rest; one of a fall is reckoned from there. */
const closesAtRest = ({ entries, closing }: Ledger) =>
  entries.at(-1)?.phase === 'settling' || closing.closes !== null

/** The phase; in a series of hops the push that starts it, each contact and flight by number, and the landing. */
function entryWords(entries: Ledger['entries'], i: number): string {
  const { phase } = entries[i]!
  const isSeries = entries.filter((entry) => entry.phase === 'contact').length > 1
  if (!isSeries) return phaseWords[phase]
  if (i === 0) return 'First push'
  if (phase === 'contact' && i === entries.length - 1) return 'Landing to standing'
  if (phase === 'flight' && i === 1) return 'First flight'
  return `${phaseWords[phase]} ${Math.floor((phase === 'contact' ? i : i - 1) / 2)}`
}

/** Whether the books close, in a sentence. */
function closingSentence(ledger: Ledger): string {
  const { closing } = ledger
  if (fell(ledger) && closesAtRest(ledger))
    return 'The account is reckoned backwards from the quiet stance after the landing: it closes by itself, and closing proves nothing.'
  const U = formatUncertainty(closing.U, display)
  if (closing.closes === null || U === null) {
    return 'The closing balance cannot be tested: the recording has no quiet stance after the landing.'
  }
  return closing.closes
    ? `Zero lies within the closing balance’s ${U} ${display.unit}: the books close.`
    : `Zero lies outside the closing balance’s ${U} ${display.unit}: the books do not close. What is left over is measurement error; the Trial checks say what it touches.`
}
