import type { MetricKey } from '../../../../shared/mechanics/catalogue.ts'
import { contactNotes } from './contact-notes.ts'
import { forceNotes } from './force-notes.ts'
import { impulseNotes } from './impulse-notes.ts'
import { jumpNotes } from './jump-notes.ts'
import { landingNotes } from './landing-notes.ts'
import type { MetricNote } from './note.ts'
import { pushNotes } from './push-notes.ts'
import { sidesNotes } from './sides-notes.ts'
import { squatNotes } from './squat-notes.ts'
import { weighingNotes } from './weighing-notes.ts'

/** The Method note of every metric of the catalogue: one that is missing is an error of types. */
export const metricNotes: Readonly<Record<MetricKey, MetricNote>> = {
  ...weighingNotes,
  ...jumpNotes,
  ...impulseNotes,
  ...forceNotes,
  ...pushNotes,
  ...squatNotes,
  ...contactNotes,
  ...landingNotes,
  ...sidesNotes,
}
