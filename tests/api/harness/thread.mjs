import { register } from 'tsx/esm/api'

// The product's process runs under tsx, whose threads inherit that; a test runner's does not.
register()
export const { readFile, analyseSamples, warmUp } = await import('../../../server/jobs/threads/tasks.ts')
