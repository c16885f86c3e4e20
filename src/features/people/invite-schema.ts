import { InviteForm } from '../../../shared/contracts/people.ts'

/** An athlete without a record would sign in to an empty page that nothing ever fills. */
export const InviteSchema = InviteForm.refine(
  ({ roles, athleteId }) => !roles.includes('athlete') || athleteId !== null,
  { path: ['athleteId'], message: 'Choose the athlete’s record, so that they see their own results' },
)
