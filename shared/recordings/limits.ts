/** Largest file that is read, in bytes (64 MiB). */
export const MAX_FILE_BYTES = 64 * 1024 * 1024

/** Longest recording that is read, in samples a channel. */
export const MAX_SAMPLES = 2_000_000

/** Fewer samples than this hold no movement at any rate a plate runs at. */
export const MIN_SAMPLES = 10

/** No plate measures more (100 t); what is above is no force in newtons, and would not fit the stored form. */
export const MAX_FORCE_N = 1_000_000

/** Share of samples that may be blank or unreadable before the file counts as damaged. Ours. */
export const MAX_FILLED_SHARE = 0.05

/** Longest gap in seconds that is bridged by a straight line. Ours: longer would invent a landing's peak. */
export const MAX_GAP_S = 0.1
