import type { Logger } from 'pino'

/** Ends the process in good order on Ctrl-C or a supervisor's request; a second signal ends it at once. */
export function stopOnSignal(log: Logger, stop: () => Promise<void>): void {
  let stopping = false
  const onSignal = (signal: NodeJS.Signals) => {
    if (stopping) process.exit(1)
    stopping = true
    log.info({ signal }, 'stopping')
    stop().then(
      () => process.exit(0),
      (error: unknown) => {
        log.error({ err: error }, 'could not stop in good order')
        process.exit(1)
      },
    )
  }
  process.on('SIGINT', onSignal).on('SIGTERM', onSignal)
}
