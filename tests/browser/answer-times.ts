import type { Page } from 'playwright-core'

export interface AnswerTimes {
  median: number
  longest: number
  count: number
}

/**
 * ms from a key press, as the page got it, to the frame that shows what it changed in an element, press after press.
 * Every press must change the element.
 */
export async function answerTimes(
  page: Page,
  selector: string,
  key: string,
  presses: number,
): Promise<AnswerTimes> {
  const answers = await page.evaluateHandle((watched) => {
    const times: number[] = []
    let pressedAt: number | null = null
    window.addEventListener('keydown', (event) => (pressedAt = event.timeStamp), { capture: true })
    new MutationObserver(() => {
      if (pressedAt === null) return
      const since = pressedAt
      pressedAt = null
      requestAnimationFrame(() => times.push(performance.now() - since))
    }).observe(document.querySelector(watched)!, { subtree: true, characterData: true, childList: true })
    return times
  }, selector)
  for (let i = 1; i <= presses; i++) {
    await page.keyboard.press(key)
    await page.waitForFunction(([times, count]) => times.length >= count, [answers, i] as const)
  }
  return summaryOf(await answers.jsonValue())
}

/** Times every answer of the page's workers from now on; the function it gives tells them, in milliseconds. */
export async function timeWorkers(page: Page): Promise<() => Promise<AnswerTimes>> {
  const answers = await page.evaluateHandle(() => {
    const times: number[] = []
    const post = Worker.prototype.postMessage as (this: Worker, message: unknown) => void
    Worker.prototype.postMessage = function (this: Worker, message: unknown) {
      const asked = performance.now()
      this.addEventListener('message', () => times.push(performance.now() - asked), { once: true })
      post.call(this, message)
    }
    return times
  })
  return async () => summaryOf(await answers.jsonValue())
}

function summaryOf(answers: number[]): AnswerTimes {
  const times = [...answers].sort((a, b) => a - b)
  return { median: times[times.length >> 1] ?? NaN, longest: times.at(-1) ?? NaN, count: times.length }
}
