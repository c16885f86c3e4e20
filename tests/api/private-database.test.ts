import { spawn } from 'node:child_process'
import { once } from 'node:events'
import { randomBytes } from 'node:crypto'
import { rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { makeCluster, startCluster, type Cluster } from '../../server/setup/cluster.mjs'
import { onDatabase } from '../../server/setup/database-urls.mjs'
import { pause } from '../../server/setup/pause.mjs'
import { runningServer } from '../../server/setup/postgres-server.mjs'
import { serverUserFor } from '../../server/setup/server-user.mjs'

const folder = join(tmpdir(), `underfoot-test-${randomBytes(6).toString('hex')}`)
let cluster: Cluster

beforeAll(async () => {
  const user = serverUserFor(folder)
  if (!user) throw new Error(`The database server's user cannot write to ${folder}.`)
  cluster = { folder, log: `${folder}.log`, user, password: 'secret', settings: { fsync: 'off' } }
  await makeCluster(cluster)
})
afterAll(async () => {
  await (await startCluster(cluster)).stop()
  for (const path of [folder, cluster.log]) rmSync(path, { recursive: true, force: true })
})

const count = (adminUrl: string) =>
  onDatabase(adminUrl, async (admin) => {
    await admin.query('create table if not exists starts (n serial)')
    await admin.query('insert into starts default values')
    return (await admin.query('select from starts')).rowCount
  })

async function untilEnded(): Promise<void> {
  while (runningServer(folder)) await pause()
}

describe('the private database', () => {
  it('keeps its data from one start to the next', async () => {
    const first = await startCluster(cluster)
    expect(await count(first.adminUrl)).toBe(1)
    await first.stop()
    expect(runningServer(folder)).toBeUndefined()
    const second = await startCluster(cluster)
    expect(await count(second.adminUrl)).toBe(2)
    await second.stop()
  })

  it('is taken over where a server still runs', async () => {
    const first = await startCluster(cluster)
    const second = await startCluster(cluster)
    expect(second.port).toBe(first.port)
    await second.stop()
    expect(runningServer(folder)).toBeUndefined()
  })

  it('listens on loopback only, and asks for the password', async () => {
    const { adminUrl, stop } = await startCluster(cluster)
    const shown = await onDatabase(adminUrl, (admin) => admin.query('show listen_addresses'))
    expect(shown.rows).toEqual([{ listen_addresses: '127.0.0.1' }])
    const guess = onDatabase(adminUrl.replace('secret', 'guess'), (admin) => admin.query('select 1'))
    await expect(guess).rejects.toThrow(/password authentication failed/)
    await stop()
  })

  it('starts again after the server was killed', async () => {
    const { adminUrl } = await startCluster(cluster)
    const before = await count(adminUrl)
    process.kill(runningServer(folder)?.pid ?? 0, 'SIGKILL')
    const again = await startCluster(cluster)
    expect(await count(again.adminUrl)).toBe((before ?? 0) + 1)
    await again.stop()
  })

  it('ends with a starter that was killed, and starts again', async () => {
    const program = `
      import { startCluster } from '${new URL('../../server/setup/cluster.mjs', import.meta.url).href}'
      await startCluster(${JSON.stringify(cluster)})
      console.log('started')
      process.stdin.on('end', () => process.exit()).resume() // ends with the test, even a killed one`
    const starter = spawn(process.execPath, ['--input-type=module', '-e', program])
    await once(starter.stdout, 'data')
    starter.kill('SIGKILL')
    await untilEnded()
    const again = await startCluster(cluster)
    expect(await count(again.adminUrl)).toBeGreaterThan(1)
    await again.stop()
  })
})
