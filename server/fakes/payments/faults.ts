/** A failure on demand: of the next call of the API whose "METHOD /path" holds the text. */
export interface Fault {
  /** `time-out`: the call is done and its answer never comes. `error`: a 500, and nothing was done. */
  kind: 'time-out' | 'error'
  /** Part of "POST /v1/subscriptions"; empty for any call. */
  of: string
}

/** Takes the first fault that fits the call out of the list. */
export function takeFault(faults: Fault[], call: string): Fault | null {
  const index = faults.findIndex(({ of }) => call.includes(of))
  return index < 0 ? null : (faults.splice(index, 1)[0] ?? null)
}
