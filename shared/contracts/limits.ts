import { MAX_FILE_BYTES } from '../recordings/limits.ts'

/** Limits, each written once: forms, client and server read them here. */
export const limits = {
  fileBytes: MAX_FILE_BYTES,
  chunkBytes: 1024 * 1024,
  filesPerDrop: 300,
  /** Of one person in one club, announced and not all here: a page sends four at once, and some stop half-way. */
  unfinishedUploads: 100,
  unfinishedBytes: 2 * 1024 ** 3,
  /** A chunk of 1 MiB on a slow line of 10 kB/s takes this long: what is silent for longer has stopped. */
  arrivingSeconds: 105,
  fileNameCharacters: 255,
  nameCharacters: 120,
  emailCharacters: 254,
  titleCharacters: 120,
  noteCharacters: 2000,
  reasonCharacters: 300,
  passwordMin: 12,
  passwordMax: 200,
  bodyMassKg: { min: 20, max: 250 },
  externalLoadKg: { min: 0, max: 300 },
  boxHeightM: { min: 0.05, max: 2 },
  landingPeakBodyWeights: { min: 1, max: 20 },
  invitationDays: 14,
  resetMinutes: 60,
  seats: { min: 1, max: 5000 },
  /** A seat that was used stays its athlete's for so long, also when it is given back earlier. */
  seatCoolingDays: 14,
  trialDays: 30,
  trialSeats: 40,
  /** From the first declined charge until a club only reads. Common practice: two weeks. */
  graceDays: 14,
  /** Days before a club only reads on which its admins are reminded, the first first. */
  remindDaysBefore: [7, 2],
} as const
