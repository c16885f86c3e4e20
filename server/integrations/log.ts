import pino, { type DestinationStream, type Logger } from 'pino'
import { databaseErrorOf } from '../db/constraint-errors.ts'

/** Fields that hold secrets, addresses, notes or samples wherever they turn up. */
const secretFields = [
  'password',
  'current',
  'next',
  'token',
  'email',
  'to',
  'toAddress',
  'note',
  'samples',
  'cookie',
  'authorization',
  '["set-cookie"]',
]
const redactedPaths = secretFields.flatMap((field) =>
  field.startsWith('[') ? [field, `*${field}`, `*.*${field}`] : [field, `*.${field}`, `*.*.${field}`],
)

/** Structured log of a process, one JSON object a line. */
export function createLog(level: string, destination?: DestinationStream): Logger {
  const options = {
    level,
    redact: { paths: redactedPaths, censor: '[hidden]' },
    serializers: { err: describeError },
  }
  return destination ? pino(options, destination) : pino(options)
}

/** An error without the values that a query was run with, and without addresses. */
export function describeError(error: unknown) {
  if (!(error instanceof Error)) return { message: scrub(String(error)) }
  const database = databaseErrorOf(error)
  const { name, stack } = error
  const message = database ? database.message : error.message
  const frames = stack?.split('\n').filter((line) => /^\s+at /.test(line))
  return {
    name,
    message: scrub(message),
    stack: frames?.join('\n'),
    ...(database && { code: database.code, constraint: database.constraint, table: database.table }),
  }
}

/** Takes mail addresses and the tokens of mailed links out of a text. */
export function scrub(text: string): string {
  return text
    .replace(/[^\s<>"'(),:;]+@[^\s<>"'(),:;]+/g, '[address]')
    .replace(/(\/(?:api\/)?(?:invitations|invite|resets|reset)\/)(?!:)[^/?#\s"']+/g, '$1[token]')
}
