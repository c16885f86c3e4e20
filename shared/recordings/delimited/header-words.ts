import type { ForceUnit, TimeUnit } from '../result.ts'

/**
 * Words and abbreviations met in column headings, lower case and without accents, in the languages in which
 * exports are common. They are field terms and dictionary words.
 */
export const TIME_WORDS = new Set([
  'time',
  't',
  'timestamp',
  'elapsed',
  'zeit',
  'temps',
  'tiempo',
  'tempo',
  'tijd',
  'tid',
])

export const FORCE_WORDS = new Set([
  ...['force', 'forces', 'f', 'fz', 'grf', 'vgrf', 'grfz', 'grfv', 'grfvertical', 'load'],
  ...['kraft', 'fuerza', 'forza', 'forca', 'kracht', 'bodenreaktionskraft'],
])

export const LEFT_WORDS = new Set([
  ...['left', 'l', 'lt', 'lft', 'lh', 'fzl', 'lfz', 'leftfoot', 'leftleg'],
  ...[
    'links',
    'linker',
    'linke',
    'li',
    'gauche',
    'izquierda',
    'izquierdo',
    'izq',
    'sinistra',
    'sinistro',
    'sx',
  ],
  ...['esquerda', 'esquerdo', 'esq', 'vanster', 'venstre'],
])

export const RIGHT_WORDS = new Set([
  ...['right', 'r', 'rt', 'rgt', 'rh', 'fzr', 'rfz', 'rightfoot', 'rightleg'],
  ...[
    'rechts',
    'rechter',
    'rechte',
    're',
    'droite',
    'droit',
    'derecha',
    'derecho',
    'der',
    'destra',
    'destro',
    'dx',
  ],
  ...['direita', 'direito', 'dir', 'hoger', 'hoyre', 'hojre'],
])

export const TOTAL_WORDS = new Set([
  'total',
  'sum',
  'combined',
  'both',
  'gesamt',
  'summe',
  'somme',
  'suma',
  'totale',
])

export const VERTICAL_WORDS = new Set([
  'z',
  'fz',
  'grfz',
  'vgrf',
  'grfv',
  'fzl',
  'fzr',
  'lfz',
  'rfz',
  'vertical',
  'vert',
  'vertikal',
])

/** Parts of one plate: the corners or halves whose forces add up to it. */
export const PART_WORDS = new Set([
  ...['front', 'rear', 'back', 'heel', 'toe', 'forefoot', 'rearfoot', 'inner', 'outer', 'medial', 'lateral'],
  ...['cell', 'sensor', 'corner', 'a', 'b', 'c', 'd', '1', '2', '3', '4'],
])

/** Quantities that are no vertical force, whatever else their heading says. */
export const OTHER_WORDS = new Set([
  ...[
    'fx',
    'fy',
    'x',
    'y',
    'mx',
    'my',
    'mz',
    'moment',
    'torque',
    'horizontal',
    'shear',
    'ap',
    'ml',
    'anterior',
  ],
  ...[
    'posterior',
    'mediolateral',
    'anteroposterior',
    'lateralforce',
    'resultant',
    'net',
    'cop',
    'copx',
    'copy',
    'ax',
    'ay',
  ],
  ...[
    'velocity',
    'speed',
    'displacement',
    'position',
    'acceleration',
    'power',
    'impulse',
    'work',
    'rate',
    'rfd',
    'yank',
  ],
  ...[
    'emg',
    'trigger',
    'sync',
    'marker',
    'event',
    'phase',
    'label',
    'angle',
    'temperature',
    'status',
    'valid',
  ],
  ...[
    'sample',
    'samples',
    'frame',
    'frames',
    'index',
    'row',
    'no',
    'subframe',
    'contact',
    'flight',
    'asymmetry',
    'mass',
  ],
  ...['filtered', 'smoothed', 'normalised', 'normalized', 'percent', 'peak', 'mean', 'max', 'min'],
])

export const FORCE_UNITS = new Map<string, ForceUnit>([
  ...['n', 'newton', 'newtons'].map((unit) => [unit, 'N'] as const),
  ...['kn', 'kilonewton', 'kilonewtons'].map((unit) => [unit, 'kN'] as const),
])

export const TIME_UNITS = new Map<string, TimeUnit>([
  ...['s', 'sec', 'secs', 'second', 'seconds', 'sek', 'sekunden'].map((unit) => [unit, 's'] as const),
  ...['ms', 'msec', 'msecs', 'millisecond', 'milliseconds'].map((unit) => [unit, 'ms'] as const),
])

/** Units that are known and neither newtons nor seconds. */
export const OTHER_UNITS = new Set([
  ...[
    'kg',
    'kgf',
    'kp',
    'lb',
    'lbs',
    'lbf',
    'g',
    'bw',
    '%bw',
    'xbw',
    '%',
    'v',
    'mv',
    'uv',
    'bit',
    'bits',
    'counts',
    'adc',
  ],
  ...[
    'm',
    'cm',
    'mm',
    'm/s',
    'm/s2',
    'm/s^2',
    'm.s-1',
    'w',
    'w/kg',
    'n/kg',
    'n/s',
    'nm',
    'n.m',
    'n*m',
    'n·m',
    'nmm',
    'n·mm',
  ],
  ...['ns', 'n.s', 'n·s', 'us', 'µs', 'μs', 'min', 'h', 'hh:mm:ss', 'hz', 'deg', '°', 'rad', 'j', '°c'],
])
