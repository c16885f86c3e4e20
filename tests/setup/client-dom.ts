import { WorkerInProcess } from './worker-in-process.ts'

/** What a browser has and jsdom has not, as far as the client leans on it. */

/** Where the focus was before a dialog opened. */
const before = new WeakMap<HTMLDialogElement, Element | null>()

if (!('showModal' in HTMLDialogElement.prototype)) {
  Object.assign(HTMLDialogElement.prototype, {
    show(this: HTMLDialogElement) {
      this.open = true
    },
    showModal(this: HTMLDialogElement) {
      this.open = true
      before.set(this, document.activeElement)
      const first = this.querySelector<HTMLElement>('input, select, textarea, button')
      first?.focus()
    },
    close(this: HTMLDialogElement) {
      this.open = false
      // As in a browser: a dialog that is out of the page already gives no focus back.
      const back = this.isConnected ? before.get(this) : null
      if (back instanceof HTMLElement) back.focus()
    },
  })
}

window.scrollTo = () => {}

class StillObserver {
  observe() {}
  unobserve() {}
  disconnect() {}
}
globalThis.ResizeObserver ??= StillObserver

// The engine's worker is the only one that the client starts.
Object.assign(globalThis, { Worker: WorkerInProcess })

// Nothing is drawn here; a canvas says so instead of complaining.
HTMLCanvasElement.prototype.getContext = () => null
