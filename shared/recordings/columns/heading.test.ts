import { describe, expect, it } from 'vitest'
import { readHeading, unitOf } from './heading.ts'

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
    ['Time (hh:mm:ss)', 'clock'],
    ['Uhrzeit [hh:mm:ss.fff]', 'clock'],
    ['Time (µs)', 'us'],
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
    ['Load (kg)', 'kgf'],
    ['Force (lbf)', 'lbf'],
    ['Force [BW]', 'BW'],
    ['Force (%BW)', '%BW'],
    ['Fx (N)', 'N'],
  ])('takes %s for a force in %s', (cell, unit) => {
    expect([readHeading(cell).quantity, unitText(cell)]).toStrictEqual(['force', unit])
  })

  it.each(['Mz (N·m)', 'Velocity (m/s)', 'Contact time (ms)', 'Left COPx (mm)', 'Net force (N)', ''])(
    'takes %s for neither',
    (cell) => {
      expect(readHeading(cell).quantity).toBe('other')
    },
  )

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

  it.each([
    ['Sample', 'sample'],
    ['Frame no.', 'sample'],
    ['Sub Frame', 'within'],
    ['SubFrame', 'within'],
    ['Time (samples)', 'sample'],
  ])('takes %s for a count of samples', (cell, quantity) => {
    expect(readHeading(cell).quantity).toBe(quantity)
  })

  it.each([
    ['Fx (N)', 'x', ''],
    ['Plate 2 Fz (N)', 'z', 'plate 2'],
    ['Fy1 (N)', 'y', '1'],
    ['Vertical force (N)', 'up', ''],
    ['Anterior force (N)', 'level', ''],
    ['Left (N)', null, 'left'],
  ])('reads the axis of %s as %s', (cell, axis, plate) => {
    expect(readHeading(cell)).toMatchObject({ axis, plate })
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
