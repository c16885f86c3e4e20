import { expect, it } from 'vitest'
import { analysedProtocols } from './analysed.ts'
import { protocolTable } from './table.ts'

it('offers exactly the tests that are analysed', () => {
  expect(Object.keys(protocolTable).sort()).toEqual([...analysedProtocols].sort())
})
