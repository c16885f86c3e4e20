import { Link, useParams } from 'react-router-dom'
import { isMetricKey } from '../../shared/mechanics/catalogue.ts'
import { isCheckKey } from '../../shared/mechanics/checks/check-definitions.ts'
import { PageHead } from '../components/page-head.tsx'
import { CheckNoteView } from '../features/methods/check-note-view.tsx'
import { MetricNoteView } from '../features/methods/metric-note-view.tsx'
import { paths } from '../lib/paths.ts'

export function MethodNotePage() {
  const { key = '' } = useParams()
  if (isMetricKey(key)) return <MetricNoteView metricKey={key} />
  if (isCheckKey(key)) return <CheckNoteView checkKey={key} />
  return (
    <>
      <PageHead title="There is no such note" />
      <p>
        No figure and no check goes by “{key}”. <Link to={paths.methods}>See all Method notes</Link>.
      </p>
    </>
  )
}
