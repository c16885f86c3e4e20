import { parseArgs } from 'node:util'
import { z } from 'zod'
import { Email, Name } from '../../shared/contracts/fields.ts'
import { limits } from '../../shared/contracts/limits.ts'
import { ConfigProblem, loadConfig } from '../config/config.ts'
import { createDatabase } from '../db/database.ts'
import { foundClub } from '../modules/clubs/found-club.ts'

const usage = `Makes a club and invites its first admin.

  npm run club:create -- --name "Name of the club" --admin-email mail@example.org --admin-name "First Last"

  --time-zone  IANA name of the club's time zone (default Europe/London)
  --seats      seats that the club has without a subscription (default 0)
  --trial      ${limits.trialDays} days with ${limits.trialSeats} seats; after that it only reads until it buys some`

const timeZones = new Set([...Intl.supportedValuesOf('timeZone'), 'UTC'])
const Options = z.strictObject({
  name: Name,
  'admin-email': Email,
  'admin-name': Name,
  'time-zone': z
    .string()
    .default('Europe/London')
    .refine((zone) => timeZones.has(zone), 'Give an IANA name, such as Europe/London'),
  trial: z.boolean().default(false),
  seats: z.coerce.number().int().min(0).max(100_000).default(0),
})

function readOptions() {
  const text = { type: 'string' } as const
  const options = {
    ...{ name: text, 'admin-email': text, 'admin-name': text, 'time-zone': text, seats: text },
    trial: { type: 'boolean' } as const,
  }
  const parsed = Options.safeParse(parseArgs({ options }).values)
  if (parsed.success) return parsed.data
  const lines = parsed.error.issues.map((issue) => `--${issue.path.join('.')}: ${issue.message}`)
  throw new ConfigProblem(`${lines.join('\n')}\n\n${usage}`)
}

async function main(): Promise<void> {
  const { name, seats, trial, ...rest } = readOptions()
  const config = loadConfig('web')
  const db = createDatabase(config, () => undefined)
  try {
    const admin = { email: rest['admin-email'], name: rest['admin-name'] }
    const club = { name, seats, trial, timeZone: rest['time-zone'], demo: false }
    const link = await foundClub({ db, config, clock: () => new Date() }, club, admin)
    console.log(
      `${name} is made. ${admin.name} becomes its admin at this link, which works once:\n\n  ${link}\n`,
    )
  } finally {
    await db.close()
  }
}

try {
  await main()
} catch (error) {
  const known = error instanceof ConfigProblem || (error instanceof TypeError && 'code' in error)
  console.error(known ? error.message : error)
  process.exitCode = 1
}
