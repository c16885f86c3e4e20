import { z } from 'zod'
import { limits } from './limits.ts'

/** Field schemas that several nouns share. */
/** In lower case, as the database writes it: the same id is never two texts. */
export const Id = z.uuid().toLowerCase()
export const Version = z.int32().positive()
/** The calendar has no year 0, and neither has the database. */
export const IsoDate = z.iso.date('Give a date').refine((date) => !date.startsWith('0000'), 'Give a date')
export const Moment = z.iso.datetime()
/** Blanks round an address, as pasting leaves them, are taken off before it is judged. */
export const Email = z
  .string()
  .trim()
  .toLowerCase()
  .pipe(z.email('Give an e-mail address').max(limits.emailCharacters, 'This address is too long'))
export const Name = z
  .string()
  .trim()
  .min(1, 'Give a name')
  .max(limits.nameCharacters, `Use at most ${limits.nameCharacters} characters`)
export const Password = z
  .string()
  .min(limits.passwordMin, `Use at least ${limits.passwordMin} characters`)
  .max(limits.passwordMax, `Use at most ${limits.passwordMax} characters`)
const { min: lightest, max: heaviest } = limits.bodyMassKg
const massSentence = `Give a body mass of ${lightest} to ${heaviest} kg`
export const BodyMassKg = z.number(massSentence).min(lightest, massSentence).max(heaviest, massSentence)
