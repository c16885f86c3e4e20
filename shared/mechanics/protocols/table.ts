import type { Protocol } from '../types.ts'
import { analyseCmj } from './cmj.ts'
import { analyseDj } from './dj.ts'
import { analyseDropLanding } from './drop-landing.ts'
import { analyseHops } from './hops.ts'
import type { AnalyseTrial } from './protocol.ts'
import { analyseSj } from './sj.ts'
import { analyseSlcmj } from './slcmj.ts'

/** Who analyses which test. */
export const protocolTable: Readonly<Partial<Record<Protocol, AnalyseTrial>>> = {
  cmj: analyseCmj,
  sj: analyseSj,
  dj: analyseDj,
  slcmj: analyseSlcmj,
  dropLanding: analyseDropLanding,
  hops: analyseHops,
}
