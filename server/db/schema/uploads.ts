import { sql } from 'drizzle-orm'
import {
  bigint,
  check,
  foreignKey,
  index,
  integer,
  jsonb,
  pgPolicy,
  primaryKey,
  text,
  uniqueIndex,
  uuid,
} from 'drizzle-orm/pg-core'
import {
  club,
  clubId,
  createdAt,
  id,
  moment,
  ownClubPolicy,
  rowVersion,
  staffOnlyPolicy,
  webRole,
} from './base.ts'
import type { Note } from '../../../shared/mechanics/types.ts'
import type { ColumnMap, FileFormat } from '../../../shared/recordings/result.ts'
import { bytea, clubs, memberships } from './identity.ts'
import { sessions } from './sessions.ts'

/** An original is never deleted; bytes that came twice are, before they count as a file. */
const onlyUnfinishedDeleted = (table: string, unfinished: ReturnType<typeof sql>) =>
  pgPolicy(`${table}_only_unfinished_deleted`, {
    as: 'restrictive',
    for: 'delete',
    to: [webRole],
    using: unfinished,
  })

/** A file inside an archive that is kept as it came: where its bytes stand there. */
export interface ArchivedFile {
  /** As in the archive, with `/` between folders. */
  path: string
  /** First byte of the packed data, and how many there are. */
  start: number
  bytes: number
  method: 'stored' | 'deflated'
}

/**
 * The bytes of an original, finished once with the SHA-256 of the whole; the same bytes are one file a club. They
 * stand in chunks of their own, or inside an archive that does.
 */
export const files = club.table(
  'files',
  {
    clubId: clubId().references(() => clubs.id),
    id: id(),
    sizeBytes: bigint('size_bytes', { mode: 'number' }).notNull(),
    sha256: bytea('sha256'),
    finishedAt: moment('finished_at'),
    /** The file of the archive that holds it; null for a file with chunks of its own. */
    archiveId: uuid('archive_id'),
    archived: jsonb('archived').$type<ArchivedFile | null>(),
    createdAt: createdAt(),
  },
  (t) => [
    primaryKey({ columns: [t.clubId, t.id] }),
    foreignKey({ columns: [t.clubId, t.archiveId], foreignColumns: [t.clubId, t.id] }),
    check('files_archived', sql`(archive_id is null) = (archived is null)`),
    uniqueIndex('files_sha256')
      .on(t.clubId, t.sha256)
      .where(sql`sha256 is not null`),
    ownClubPolicy('files'),
    onlyUnfinishedDeleted('files', sql`finished_at is null`),
    staffOnlyPolicy('files'),
  ],
)

/** 1 MiB chunks, each its own short write. The column is stored EXTERNAL (custom migration): no compression on the way in. */
export const fileChunks = club.table(
  'file_chunks',
  {
    clubId: clubId(),
    fileId: uuid('file_id').notNull(),
    n: integer('n').notNull(),
    bytes: bytea('bytes').notNull(),
    receivedAt: moment('received_at').notNull().defaultNow(),
  },
  (t) => [
    primaryKey({ columns: [t.clubId, t.fileId, t.n] }),
    foreignKey({ columns: [t.clubId, t.fileId], foreignColumns: [files.clubId, files.id] }),
    ownClubPolicy('file_chunks'),
    onlyUnfinishedDeleted(
      'file_chunks',
      sql`exists (select 1 from club.files f where f.club_id = file_chunks.club_id and f.id = file_chunks.file_id and f.finished_at is null)`,
    ),
    staffOnlyPolicy('file_chunks'),
  ],
)

/** One file dropped on a session. `state`: receiving, waiting (for the read job), read, unpacked, refused, duplicate. */
export const uploads = club.table(
  'uploads',
  {
    clubId: clubId(),
    id: id(),
    sessionId: uuid('session_id').notNull(),
    fileId: uuid('file_id').notNull(),
    /** As sent, without any path part. */
    fileName: text('file_name').notNull(),
    state: text('state').notNull().default('receiving'),
    /** { code, sentence, remedy, line?, column?, seen? } where the file could not be read. */
    error: jsonb('error').$type<ReadError | null>(),
    /** How it was read: format, column map, rate, notes. */
    reading: jsonb('reading').$type<Reading | null>(),
    /** The upload that brought the same bytes first. */
    duplicateOf: uuid('duplicate_of'),
    /** The upload of the archive that this file came in, and its place there, from 1. */
    archiveUploadId: uuid('archive_upload_id'),
    archivePlace: integer('archive_place'),
    uploadedBy: uuid('uploaded_by').notNull(),
    /** Cleared from the Tray by a person; the state and the bytes stay, so that it can be taken back. */
    dismissedAt: moment('dismissed_at'),
    dismissedBy: uuid('dismissed_by'),
    version: rowVersion(),
    createdAt: createdAt(),
  },
  (t) => [
    primaryKey({ columns: [t.clubId, t.id] }),
    index('uploads_session').on(t.clubId, t.sessionId),
    index('uploads_file').on(t.clubId, t.fileId),
    index('uploads_unfinished')
      .on(t.clubId, t.uploadedBy)
      .where(sql`state = 'receiving' and dismissed_at is null`),
    foreignKey({ columns: [t.clubId, t.sessionId], foreignColumns: [sessions.clubId, sessions.id] }),
    foreignKey({ columns: [t.clubId, t.fileId], foreignColumns: [files.clubId, files.id] }),
    foreignKey({ columns: [t.clubId, t.duplicateOf], foreignColumns: [t.clubId, t.id] }),
    foreignKey({ columns: [t.clubId, t.archiveUploadId], foreignColumns: [t.clubId, t.id] }),
    uniqueIndex('uploads_of_archive').on(t.clubId, t.archiveUploadId, t.archivePlace),
    check('uploads_archive_place', sql`(archive_upload_id is null) = (archive_place is null)`),
    foreignKey({
      columns: [t.clubId, t.uploadedBy],
      foreignColumns: [memberships.clubId, memberships.personId],
    }),
    foreignKey({
      columns: [t.clubId, t.dismissedBy],
      foreignColumns: [memberships.clubId, memberships.personId],
    }),
    check('uploads_dismissal', sql`(dismissed_at is null) = (dismissed_by is null)`),
    ownClubPolicy('uploads'),
    staffOnlyPolicy('uploads'),
  ],
)

export interface ReadError {
  code: string
  sentence: string
  remedy: string
  line?: number
  column?: number
  seen?: string
}

/** What was assumed, corrected or left out, from the file's announcement on; the rest once it was read. */
export interface Reading {
  notes: Note[]
  format?: FileFormat
  columnMap?: ColumnMap
  sampleRateHz?: number
}
