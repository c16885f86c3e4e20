import type { ForceUnit, TimeUnit } from '../column-map.ts'

/**
 * Words and abbreviations met in column headings, lower case and without accents, in the languages in which
 * exports are common. They are terms of the field and dictionary words.
 */
export const words = (...lists: string[]): Set<string> => new Set(lists.flatMap((list) => list.split(' ')))

export const TIME_WORDS = words(
  'time t timestamp elapsed clock zeit uhrzeit temps heure tiempo hora tempo tijd tid',
)

/** The number of a sample, or of a frame of samples. */
export const SAMPLE_WORDS = words(
  'sample samples frame frames index row nr no num number point scan n',
  'probe bild muestra echantillon campione monster punkt',
)

/** The number of a sample within a frame. */
export const WITHIN_WORDS = words('subframe subframes subsample subsamples sub')

export const FORCE_WORDS = words(
  'force forces f fz grf vgrf grfz grfv load',
  'kraft bodenreaktionskraft fuerza forza forca kracht',
)

export const LEFT_WORDS = words(
  'left l lt lft fzl lfz leftfoot leftleg',
  'links linker linke li gauche izquierda izquierdo izq sinistra sinistro sx esquerda esquerdo esq vanster venstre',
)

export const RIGHT_WORDS = words(
  'right r rt rgt fzr rfz rightfoot rightleg',
  'rechts rechter rechte re droite droit derecha derecho der destra destro dx direita direito dir hoger hoyre hojre',
)

export const TOTAL_WORDS = words('total sum combined both gesamt summe somme suma totale')

/** Headings that say in words which way the force points. */
export const VERTICAL_WORDS = words('vgrf grfv vertical vert vertikal verticale verticaal')

/** Letters of the axes; which of them points up is the laboratory's choice. */
export const AXIS_WORDS = new Map<string, 'x' | 'y' | 'z'>([
  ...(['x', 'fx', 'grfx', 'rx'] as const).map((word) => [word, 'x'] as const),
  ...(['y', 'fy', 'grfy', 'ry'] as const).map((word) => [word, 'y'] as const),
  ...(['z', 'fz', 'grfz', 'rz', 'fzl', 'fzr', 'lfz', 'rfz'] as const).map((word) => [word, 'z'] as const),
])

/** Horizontal directions in words. */
export const HORIZONTAL_WORDS = words(
  'horizontal shear ap ml anterior posterior mediolateral anteroposterior forward sideways',
)

/** Parts of one plate: the corners or halves whose forces add up to it. */
export const PART_WORDS = words(
  'front rear back heel toe forefoot rearfoot inner outer medial lateral',
  'cell sensor corner a b c d 1 2 3 4',
)

/** Quantities that are no vertical force and no time of day, whatever else their heading says. */
export const OTHER_WORDS = words(
  'mx my mz moment torque',
  'resultant net cop copx copy ax ay velocity speed displacement position acceleration power impulse work rate rfd',
  'emg trigger sync marker event phase label angle temperature status valid contact flight asymmetry mass',
  'filtered smoothed normalised normalized percent peak mean max min',
)

const units = <Unit>(unit: Unit, spellings: string): [string, Unit][] =>
  spellings.split(' ').map((text) => [text, unit])

/** Spellings of a unit, lower case. A plate that shows kilograms or pounds means their weight. */
export const FORCE_UNITS = new Map<string, ForceUnit>([
  ...units('N' as const, 'n newton newtons'),
  ...units('kN' as const, 'kn kilonewton kilonewtons'),
  ...units('kgf' as const, 'kgf kp kg kilogram kilograms kilogramforce kilopond'),
  ...units('lbf' as const, 'lbf lb lbs pound pounds poundforce'),
  ...units('BW' as const, 'bw xbw ×bw bodyweight bodyweights n/bw kg/kg'),
  ...units('%BW' as const, '%bw bw% %bodyweight'),
])

/** Spellings that mean a mass, taken as its weight. */
export const MASS_SPELLINGS = words('kg kilogram kilograms lb lbs pound pounds')

export const TIME_UNITS = new Map<string, TimeUnit>([
  ...units('s' as const, 's sec secs second seconds sek sekunden segundos secondes'),
  ...units('ms' as const, 'ms msec msecs millisecond milliseconds millisekunden'),
  ...units('us' as const, 'us µs μs usec microsecond microseconds'),
  ...units('min' as const, 'min mins minute minutes'),
  ...units('clock' as const, 'hh:mm:ss hh:mm:ss.sss hh:mm:ss.fff hh:mm:ss,sss'),
  ...units('samples' as const, 'sample samples frame frames smp'),
])

/** Units that are known and neither those of force nor of time. */
export const OTHER_UNITS = words(
  'g % v mv uv bit bits counts adc',
  'm cm mm m/s m/s2 m/s^2 m.s-1 w w/kg n/kg n/s nm n.m n*m n·m nmm n·mm ns n.s n·s',
  'h hz deg ° rad j °c',
)
