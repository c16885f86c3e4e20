import type { Protocol } from '../types.ts'
import { analyseCmj } from './cmj.ts'
import type { AnalyseTrial } from './protocol.ts'

/** Who analyses which test. */
export const protocolTable: Readonly<Partial<Record<Protocol, AnalyseTrial>>> = { cmj: analyseCmj }
