import { benchCoverage } from './coverage.ts'
const t=performance.now(); const b = benchCoverage(Number(process.argv[2])); console.log(b.table, (performance.now()-t)/1000); for (const m of ['takeoffVelocity','landingPeakForce','landingLoadingRate2080','timeToTakeoff'] as const) console.log(m, Object.entries(b.coverage[m].strata).map(([k,v])=>k+' '+(v.covered*100).toFixed(1)).join(', '))
