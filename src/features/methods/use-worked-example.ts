import { useQuery } from '@tanstack/react-query'
import { getSampleRecording, sampleRecordings } from '../../api/methods/get-sample-recording.ts'
import type { Protocol } from '../../../shared/mechanics/types.ts'

/**
 * The sample recording of a test as the engine measures it here and now, beside the page; once for all notes of
 * that test.
 */
export function useWorkedExample(protocol: Protocol) {
  return useQuery({
    queryKey: ['worked-example', protocol],
    staleTime: Infinity,
    structuralSharing: false,
    queryFn: async ({ signal }) => {
      const { path, test } = sampleRecordings[protocol]
      const [bytes, { openEngine }] = await Promise.all([
        getSampleRecording(path, signal),
        import('../trials/engine/open-engine.ts'),
      ])
      const engine = openEngine()
      try {
        return await engine.ask('workOut', { bytes, fileName: path.slice(path.lastIndexOf('/') + 1), test })
      } finally {
        engine.close()
      }
    },
  })
}
