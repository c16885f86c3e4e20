import type { Invoice } from '../../../shared/contracts/billing.ts'
import type { Column } from '../../components/table.tsx'
import { Tag } from '../../components/tag.tsx'
import { formatMoment } from '../../lib/format-date.ts'
import { showMoney } from '../../lib/show-money.ts'

export function invoiceColumns(timeZone: string): Column<Invoice>[] {
  return [
    {
      key: 'number',
      head: 'Invoice',
      cell: ({ number, id, url }) => (url ? <a href={url}>{number ?? id}</a> : (number ?? id)),
    },
    { key: 'at', head: 'Made', cell: ({ at }) => formatMoment(at, timeZone) },
    { key: 'total', head: 'Total', figure: true, cell: ({ total }) => showMoney(total) },
    { key: 'status', head: 'State', cell: ({ status }) => stateOf(status) },
  ]
}

function stateOf(status: Invoice['status']) {
  if (status === 'paid') return 'paid'
  return status === 'open' ? <Tag tone="stop">to be paid</Tag> : 'void'
}
