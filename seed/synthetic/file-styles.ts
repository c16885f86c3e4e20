/** How a program writes its files: invented styles of the kinds that are common. */
export interface FileStyle {
  delimiter: ',' | ';' | '\t' | '|'
  lineBreak: '\n' | '\r\n'
  byteOrderMark: boolean
  /** Headings without their unit's brackets: the whole cell as written. */
  headings: { time: string; left: string; right: string; single: string; total: string }
  quoteHeadings: boolean
  timeUnit: 's' | 'ms'
  timeDecimals: number
  forceUnit: 'N' | 'kN'
  forceDecimals: number
  /** Heading of a column that counts the samples from 1, before the others; null for none. */
  counter: string | null
  /** Heading of a column with the sum of the plates, after the others; null for none. */
  total: string | null
  /** Lines above the headings. */
  preamble: string[]
}

const plain: FileStyle = {
  delimiter: ',',
  lineBreak: '\n',
  byteOrderMark: false,
  headings: {
    time: 'Time (s)',
    left: 'Left (N)',
    right: 'Right (N)',
    single: 'Force (N)',
    total: 'Total (N)',
  },
  quoteHeadings: false,
  timeUnit: 's',
  timeDecimals: 3,
  forceUnit: 'N',
  forceDecimals: 2,
  counter: null,
  total: null,
  preamble: [],
}

/** A style with the defaults of the plain one. */
export function fileStyle(changes: Partial<FileStyle> = {}): FileStyle {
  return { ...plain, ...changes }
}

export const fileStyles = {
  plain,
  semicolon: fileStyle({
    delimiter: ';',
    lineBreak: '\r\n',
    byteOrderMark: true,
    headings: {
      time: 'time [ms]',
      left: 'Fz left [N]',
      right: 'Fz right [N]',
      single: 'Fz [N]',
      total: 'Fz total [N]',
    },
    timeUnit: 'ms',
    timeDecimals: 0,
    forceDecimals: 1,
  }),
  tabbed: fileStyle({
    delimiter: '\t',
    headings: { time: 't/s', left: 'FzL/N', right: 'FzR/N', single: 'Fz/N', total: 'Fz sum/N' },
    timeDecimals: 4,
    forceDecimals: 3,
    counter: 'Sample',
  }),
  quoted: fileStyle({
    lineBreak: '\r\n',
    headings: {
      time: 'Time, s',
      left: 'Vertical force, left foot (N)',
      right: 'Vertical force, right foot (N)',
      single: 'Vertical force (N)',
      total: 'Vertical force, total (N)',
    },
    quoteHeadings: true,
    total: 'Vertical force, total (N)',
  }),
  kilonewtons: fileStyle({
    delimiter: '|',
    headings: {
      time: 'time_s',
      left: 'force_left_kN',
      right: 'force_right_kN',
      single: 'force_kN',
      total: 'force_total_kN',
    },
    forceUnit: 'kN',
    forceDecimals: 5,
  }),
} satisfies Record<string, FileStyle>
