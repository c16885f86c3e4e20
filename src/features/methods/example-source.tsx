import { sampleRecordings } from '../../api/methods/get-sample-recording.ts'
import { protocolNames } from '../../../shared/mechanics/protocols/names.ts'
import type { Protocol } from '../../../shared/mechanics/types.ts'

/** Which recording the example is, and what computed it. */
export function ExampleSource({ protocol, engineVersion }: { protocol: Protocol; engineVersion: string }) {
  return (
    <p className="pt-2 text-small text-ink-2">
      {protocolNames[protocol]}. Computed just now on this device by engine {engineVersion}, with standard
      gravity and plates calibrated to 0.5 %, from an{' '}
      <a href={sampleRecordings[protocol].path}>invented recording</a> of an invented athlete.
    </p>
  )
}
