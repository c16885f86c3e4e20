import { isApiError } from './api-error.ts'

/** Errors after which nobody knows whether the act was done: the next try must bear the same key. */
const undecided = ['no-answer', 'answer-unreadable', 'still-running', 'internal'] as const

export interface ActKeys {
  keyFor: (act: unknown) => string
  settle: (error: unknown) => void
}

/** 128 random bits. Not `randomUUID`, which a browser only has on https: a club may run this inside its own walls. */
export function randomKey(): string {
  return Array.from(crypto.getRandomValues(new Uint8Array(16)), (byte) =>
    byte.toString(16).padStart(2, '0'),
  ).join('')
}

/**
 * The `Idempotency-Key` of one form or button. The same act sent again after an unclear end bears the same key, so
 * that the server does it once; a changed act, or one after a clear answer, bears a new one.
 */
export function actKeys(newKey: () => string = randomKey): ActKeys {
  let pending: { print: string; key: string } | null = null
  return {
    keyFor(act) {
      const print = JSON.stringify(act)
      if (pending?.print !== print) pending = { print, key: newKey() }
      return pending.key
    },
    settle(error) {
      if (!undecided.some((code) => isApiError(error, code))) pending = null
    },
  }
}
