import type { AnalysedProtocol } from './analysed.ts'
import { analyseCmj } from './cmj.ts'
import type { AnalyseTrial } from './protocol.ts'

/** Who analyses which test. */
export const protocolTable: Readonly<Record<AnalysedProtocol, AnalyseTrial>> = { cmj: analyseCmj }
