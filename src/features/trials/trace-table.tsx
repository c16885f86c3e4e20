import type { TraceData } from '../../charts/trial-trace/trace-data.ts'
import { readTrace } from '../../charts/trial-trace/trace-reading.ts'
import { ScrollRegion } from '../../components/scroll-region.tsx'

/** The trace at each event, as a table. */
export function TraceTable({ data }: { data: TraceData }) {
  const rows = data.events.map((event) => ({ ...event, reading: readTrace(data, event.timeS) }))
  const heads = readTrace(data, 0).values.map((value) => value.label)
  return (
    <ScrollRegion label="Force and momentum at each event">
      <table className="data-table">
        <caption className="sr-only">Force and momentum at each event</caption>
        <thead>
          <tr>
            <th scope="col">Event</th>
            <th scope="col" className="figure">
              Time
            </th>
            {heads.map((head) => (
              <th key={head} scope="col" className="figure">
                {head}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <tr key={row.key}>
              <th scope="row">{row.adjusted ? `${row.label}, adjusted` : row.label}</th>
              <td className="figure">{row.timeS.toFixed(3)} s</td>
              {row.reading.values.map((value) => (
                <td key={value.label} className="figure">
                  {value.text}
                </td>
              ))}
            </tr>
          ))}
        </tbody>
      </table>
    </ScrollRegion>
  )
}
