import { describe, expect, it } from 'vitest'
import { readHeading, unitOf } from './header-cell.ts'

const unitText = (cell: string, below?: string): string => {
  const { unit } = readHeading(cell, below)
  if (unit.family === 'none') return 'none'
  return unit.family === 'other' ? `other ${unit.text}` : unit.unit
}

describe('readHeading', () => {
  it.each([
    ['Time (s)', 's'],
    ['Time, s', 's'],
    ['time_ms', 'ms'],
    ['timeMs', 'ms'],
    ['t/s', 's'],
    ['Zeit [Sek]', 's'],
    ['s', 's'],
  ])('takes %s for time in %s', (cell, unit) => {
    expect([readHeading(cell).quantity, unitText(cell)]).toStrictEqual(['time', unit])
  })

  it.each([
    ['Force (N)', 'N'],
    ['force in N', 'N'],
    ['forceN', 'N'],
    ['Fz <N>', 'N'],
    ['GRFz_R [kN]', 'kN'],
    ['Force, left foot (newtons)', 'N'],
    ['Plate 2 (N)', 'N'],
    ['Kraft {kN}', 'kN'],
    ['Force', 'none'],
    ['forces', 'none'],
    ['Load (kg)', 'other kg'],
  ])('takes %s for a force in %s', (cell, unit) => {
    expect([readHeading(cell).quantity, unitText(cell)]).toStrictEqual(['force', unit])
  })

  it.each([
    'Fx (N)',
    'Mz (N·m)',
    'Velocity (m/s)',
    'Sample',
    'Contact time (ms)',
    'Time (hh:mm:ss)',
    'Left COPx (mm)',
    'Net force (N)',
    '',
  ])('takes %s for neither', (cell) => {
    expect(readHeading(cell).quantity).toBe('other')
  })

  it.each([
    ['Left (N)', 'left'],
    ['L_Fz (N)', 'left'],
    ['FzL/N', 'left'],
    ['Force (left) [N]', 'left'],
    ['Fuerza izquierda (N)', 'left'],
    ['Kraft rechts (N)', 'right'],
    ['rForce (N)', 'right'],
    ['Total (N)', 'total'],
    ['Left + right (N)', 'total'],
    ['Fz1 (N)', null],
  ])('reads the foot of %s as %s', (cell, foot) => {
    expect(readHeading(cell).foot).toBe(foot)
  })

  it('takes the unit from a row below where the heading has none', () => {
    expect(unitText('Left', '[N]')).toBe('N')
    expect(unitText('Left (kN)', 'N')).toBe('kN')
  })
})

describe('unitOf', () => {
  it('knows a unit in any case and spacing, and nothing else', () => {
    expect(unitOf(' Newtons ')).toStrictEqual({ family: 'force', unit: 'N' })
    expect(unitOf('N · m')).toStrictEqual({ family: 'other', text: 'N · m' })
    expect(unitOf('north').family).toBe('none')
  })
})
