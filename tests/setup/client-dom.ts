/** What a browser has and jsdom has not, as far as the client leans on it. */

if (!('showModal' in HTMLDialogElement.prototype)) {
  Object.assign(HTMLDialogElement.prototype, {
    show(this: HTMLDialogElement) {
      this.open = true
    },
    showModal(this: HTMLDialogElement) {
      this.open = true
      const first = this.querySelector<HTMLElement>('input, select, textarea, button')
      first?.focus()
    },
    close(this: HTMLDialogElement) {
      this.open = false
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

// Nothing is drawn here; a canvas says so instead of complaining.
HTMLCanvasElement.prototype.getContext = () => null
