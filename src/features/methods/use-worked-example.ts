import { useQuery } from '@tanstack/react-query'
import { getSampleRecording, samplePath } from '../../api/methods/get-sample-recording.ts'

/** Lets the page be drawn first. Safari has no idle callback. */
function idle(): Promise<void> {
  return new Promise((resolve) => {
    if ('requestIdleCallback' in window) requestIdleCallback(() => resolve(), { timeout: 500 })
    else setTimeout(resolve)
  })
}

/** The sample recording as the engine of this very page measures it; once for all notes. */
export function useWorkedExample() {
  return useQuery({
    queryKey: ['worked-example'],
    staleTime: Infinity,
    queryFn: async ({ signal }) => {
      const [bytes, { workOut }] = await Promise.all([
        getSampleRecording(signal),
        import('./worked-example.ts'),
      ])
      await idle()
      return workOut(bytes, samplePath.slice(samplePath.lastIndexOf('/') + 1))
    },
  })
}
