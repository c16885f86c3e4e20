import { createHash, randomBytes } from 'node:crypto'

/** A secret for a mailed link, 256 random bits, and what the database keeps of it. */
export function newToken(): { token: string; tokenHash: Buffer } {
  const token = randomBytes(32).toString('base64url')
  return { token, tokenHash: hashToken(token) }
}

/** A random token needs no slow hash: it cannot be guessed from a list. */
export const hashToken = (token: string): Buffer => createHash('sha256').update(token).digest()
