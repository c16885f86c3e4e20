import { memo } from 'react'
import type { Analysis } from '../../../shared/contracts/trials.ts'
import type { MetricKey } from '../../../shared/mechanics/catalogue.ts'
import { MethodLink } from '../../components/method-link.tsx'
import { ScrollRegion } from '../../components/scroll-region.tsx'
import { Sheet } from '../../components/sheet.tsx'
import { formatNumber } from '../../lib/format-figure.ts'
import { FigureText } from '../results/figure-text.tsx'
import { figureWords } from '../results/metric-words.ts'
import { Was } from './was.tsx'

type Contact = NonNullable<Analysis['contacts']>[number]
type Measured = 'contactTime' | 'flightTime' | 'height' | 'rsi' | 'rsiFlightContact' | 'peakForce'

/** What is measured of a contact, and the metric as which it is shown and explained. */
const columns: readonly { of: Measured; metric: MetricKey; head: string }[] = [
  { of: 'contactTime', metric: 'contactTime', head: 'Contact time' },
  { of: 'flightTime', metric: 'flightTime', head: 'Flight after it' },
  { of: 'height', metric: 'jumpHeightFlight', head: 'Height from flight' },
  { of: 'rsi', metric: 'rsi', head: 'RSI' },
  { of: 'rsiFlightContact', metric: 'rsiFlightContact', head: 'Flight to contact' },
  { of: 'peakForce', metric: 'peakForce', head: 'Peak force' },
]

interface Props {
  contacts: readonly Contact[]
  checks: Analysis['checks']
  /** While events are being moved: the saved contacts. */
  saved?: readonly Contact[] | null | undefined
}

/** Every contact with the ground between two times in the air, in the order in which they came. */
export const ContactsSheet = memo(function ContactsSheet({ contacts, checks, saved }: Props) {
  const many = contacts.length > 1
  const failed = checks.find(({ verdict, affects }) => verdict === 'fail' && affects.includes('contact'))
  return (
    <Sheet title={many ? 'Contacts' : 'Contact'} titleAside={countedWords(contacts)} flush>
      {failed && <p className="px-3 pb-2 text-small text-ink-2">Withheld: {failed.sentence}</p>}
      <ScrollRegion label="Contacts with the ground">
        <table className="data-table sides-table">
          <caption className="sr-only">Contacts with the ground, and the flight after each</caption>
          <thead>
            <tr>
              <th scope="col">{many ? 'Contact, touchdown at' : 'Touchdown at'}</th>
              {columns.map(({ of, metric, head }) => (
                <th key={of} scope="col" className="figure">
                  <MethodLink noteKey={metric}>{head}</MethodLink>
                </th>
              ))}
              {many && <th scope="col">Counts</th>}
            </tr>
          </thead>
          <tbody>
            {contacts.map((contact, i) => (
              <ContactRow
                key={i}
                n={i + 1}
                contact={contact}
                saved={saved?.[i]}
                struck={failed !== undefined}
                many={many}
              />
            ))}
          </tbody>
        </table>
      </ScrollRegion>
    </Sheet>
  )
})

interface RowProps {
  n: number
  contact: Contact
  saved: Contact | undefined
  struck: boolean
  many: boolean
}

function ContactRow({ n, contact, saved, struck, many }: RowProps) {
  const quiet = struck || (many && !contact.counted)
  return (
    <tr className={quiet ? 'text-ink-2' : undefined}>
      <th scope="row" className="whitespace-nowrap">
        {many && `${n}, `}
        {formatNumber(contact.touchdownS, 3)} s
        {struck && <span className="sr-only"> (withheld by a failed check)</span>}
      </th>
      {columns.map(({ of, metric }) => (
        <td key={of} className={struck ? 'figure line-through' : 'figure'}>
          <FigureText metricKey={metric} figure={contact[of]} unit />
          {saved && <Was saved={figureWords(metric, saved[of])} now={figureWords(metric, contact[of])} />}
        </td>
      ))}
      {many && <td>{contact.counted ? 'yes' : 'no'}</td>}
    </tr>
  )
}

/** How many of a series count; nothing of a single contact. */
function countedWords(contacts: readonly Contact[]): string | undefined {
  if (contacts.length < 2) return undefined
  const counted = contacts.filter((contact) => contact.counted).length
  return `${counted} of ${contacts.length} count`
}
