import { samplePath } from '../../api/methods/get-sample-recording.ts'

/** Which recording the example is, and what computed it. */
export function ExampleSource({ engineVersion }: { engineVersion: string }) {
  return (
    <p className="pt-2 text-small text-ink-2">
      Computed just now on this device by engine {engineVersion}, with standard gravity and plates calibrated
      to 0.5 %, from an <a href={samplePath}>invented recording</a> of an invented athlete.
    </p>
  )
}
