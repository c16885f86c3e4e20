import { randomUUID } from 'node:crypto'
import { buildAthlete, buildSquad } from '../../../seed/builders/athlete.ts'
import { buildClub } from '../../../seed/builders/club.ts'
import { buildMember } from '../../../seed/builders/person.ts'
import { buildRecompute } from '../../../seed/builders/recompute.ts'
import { buildSession } from '../../../seed/builders/session.ts'
import { buildAnalysis, buildTrial, buildUpload } from '../../../seed/builders/trial.ts'
import { invite } from '../../../server/modules/people/invitations.service.ts'
import type { Harness } from './harness.ts'

/** Ids of one row of every kind in one club, and somebody who made them. */
export type OneOfEach = Awaited<ReturnType<typeof buildOneOfEach>>

/** A club with one row of every kind that a path of the API can name. */
export async function buildOneOfEach({ db, deps, workerDeps }: Harness) {
  const clubId = await buildClub(db)
  const { id: personId } = await buildMember(db, clubId, ['admin', 'coach'])
  const squadId = await buildSquad(db, clubId)
  const athleteId = await buildAthlete(db, clubId, { squadIds: [squadId] })
  const owner = { createdBy: personId, squadIds: [squadId], athleteIds: [athleteId] }
  const sessionId = await buildSession(db, clubId, owner)
  const uploadId = await buildUpload(db, clubId, { sessionId, uploadedBy: personId })
  const trialId = await buildTrial(db, clubId, { sessionId, uploadId, athleteId })
  const analysisId = await buildAnalysis(workerDeps.db, clubId, { trialId })
  const recomputeId = await buildRecompute(db, clubId, { requestedBy: personId, trialIds: [trialId] })
  const admin = {
    clubId,
    personId,
    athleteId: null,
    roles: ['admin'],
    capabilities: ['staff', 'admin'],
  } as const
  const guest = { name: 'Guest', email: `${randomUUID()}@example.org`, roles: ['coach' as const] }
  const { id: invitationId } = await invite(deps, admin, { ...guest, athleteId: null })
  return {
    clubId,
    personId,
    squadId,
    athleteId,
    sessionId,
    uploadId,
    trialId,
    analysisId,
    recomputeId,
    invitationId,
  }
}
