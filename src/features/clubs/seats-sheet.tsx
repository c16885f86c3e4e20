import { Facts } from '../../components/facts.tsx'
import { Notice } from '../../components/notice.tsx'
import { Sheet } from '../../components/sheet.tsx'
import { counted } from '../../lib/counted.ts'

interface SeatsSheetProps {
  used: number
  paid: number
  staff: number
}

export function SeatsSheet({ used, paid, staff }: SeatsSheetProps) {
  const over = used - paid
  return (
    <Sheet className="max-w-xl">
      <p className="flex flex-wrap items-baseline gap-x-3 pt-2 pb-3">
        <span className="text-figure font-semibold">{used}</span>
        <span className="text-panel text-ink-2">of {counted(paid, 'seat')} used</span>
      </p>
      {over > 0 && (
        <Notice tone="caution">
          <p>{counted(over, 'more active athlete')} than there are seats.</p>
        </Notice>
      )}
      <Facts
        facts={[
          ['Active athletes', used],
          ['Seats free', Math.max(0, -over)],
          ['Staff, without a seat', staff],
        ]}
      />
    </Sheet>
  )
}
