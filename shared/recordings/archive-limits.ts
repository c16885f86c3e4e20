/** Most files that are read out of one archive: those of one drop. */
export const MAX_ARCHIVE_FILES = 300

/** Most entries of an archive's directory, folders and what is skipped among them. Ours. */
export const MAX_ARCHIVE_ENTRIES = 3000

/** Most bytes that an archive or a workbook may unfold to (512 MiB), counted while unpacking. Ours. */
export const MAX_UNPACKED_BYTES = 512 * 1024 * 1024

/**
 * An entry that unfolds to more than this times its packed size is no text of measurements, which packs to between
 * a quarter and a fiftieth; deflate itself goes up to 1,032. Ours.
 */
export const MAX_UNPACK_RATIO = 200

/** Below this many bytes no entry is too much, whatever its ratio (1 MiB). Ours. */
export const UNSUSPICIOUS_BYTES = 1024 * 1024

/** Most cells of a workbook that are looked at. Ours: 10 columns of 60 s at 1000 Hz are 600,000. */
export const MAX_WORKBOOK_CELLS = 4_000_000
