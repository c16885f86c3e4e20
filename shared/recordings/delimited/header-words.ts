import type { ForceUnit, TimeUnit } from '../result.ts'

/**
 * Words and abbreviations met in column headings, lower case and without accents, in the languages in which
 * exports are common. They are terms of the field and dictionary words.
 */
const words = (...lists: string[]): Set<string> => new Set(lists.flatMap((list) => list.split(' ')))

export const TIME_WORDS = words('time t timestamp elapsed zeit temps tiempo tempo tijd tid')

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

export const VERTICAL_WORDS = words('z fz grfz vgrf grfv fzl fzr lfz rfz vertical vert vertikal')

/** Parts of one plate: the corners or halves whose forces add up to it. */
export const PART_WORDS = words(
  'front rear back heel toe forefoot rearfoot inner outer medial lateral',
  'cell sensor corner a b c d 1 2 3 4',
)

/** Quantities that are no vertical force and no time of day, whatever else their heading says. */
export const OTHER_WORDS = words(
  'fx fy x y mx my mz moment torque horizontal shear ap ml anterior posterior mediolateral anteroposterior',
  'resultant net cop copx copy ax ay velocity speed displacement position acceleration power impulse work rate rfd',
  'emg trigger sync marker event phase label angle temperature status valid contact flight asymmetry mass',
  'sample samples frame frames index row no subframe filtered smoothed normalised normalized percent peak mean max min',
)

const units = <Unit>(unit: Unit, spellings: string): [string, Unit][] =>
  spellings.split(' ').map((text) => [text, unit])

/** Spellings of a unit, lower case. */
export const FORCE_UNITS = new Map<string, ForceUnit>([
  ...units('N' as const, 'n newton newtons'),
  ...units('kN' as const, 'kn kilonewton kilonewtons'),
])

export const TIME_UNITS = new Map<string, TimeUnit>([
  ...units('s' as const, 's sec secs second seconds sek sekunden'),
  ...units('ms' as const, 'ms msec msecs millisecond milliseconds'),
])

/** Units that are known and neither newtons nor seconds. */
export const OTHER_UNITS = words(
  'kg kgf kp lb lbs lbf g bw %bw xbw % v mv uv bit bits counts adc',
  'm cm mm m/s m/s2 m/s^2 m.s-1 w w/kg n/kg n/s nm n.m n*m n·m nmm n·mm ns n.s n·s',
  'us µs μs min h hh:mm:ss hz deg ° rad j °c',
)
