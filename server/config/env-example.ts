import { z } from 'zod'
import { developmentSecret, keys } from './keys.ts'

/** The text of `.env.example`: every setting with its sentence, commented out at its default. */
export function envExample(): string {
  const entries = Object.values(keys).map(({ env, schema, says, example }) => {
    const standard: unknown = z.safeParse(schema, undefined).data
    const shown = standard === developmentSecret ? '' : (standard ?? example ?? '')
    return `# ${says}\n# ${env}=${String(shown)}\n`
  })
  return ['# Settings of Underfoot. All have defaults that `npm start` fills in.\n', ...entries].join('\n')
}
