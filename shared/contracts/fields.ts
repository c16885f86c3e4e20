import { z } from 'zod'
import { limits } from './limits.ts'

/** Field schemas that several nouns share. */
export const Id = z.uuid()
export const Version = z.number().int().positive()
export const IsoDate = z.iso.date()
export const Moment = z.iso.datetime()
export const Email = z.email('Give an e-mail address').max(limits.emailCharacters).trim().toLowerCase()
export const Name = z.string().trim().min(1, 'Give a name').max(limits.nameCharacters)
export const Password = z
  .string()
  .min(limits.passwordMin, `Use at least ${limits.passwordMin} characters`)
  .max(limits.passwordMax)
export const BodyMassKg = z.number().min(limits.bodyMassKg.min).max(limits.bodyMassKg.max)
