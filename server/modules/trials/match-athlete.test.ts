import { describe, expect, it } from 'vitest'
import { foldName } from '../../../shared/contracts/names.ts'
import { matchAthlete } from './match-athlete.ts'

const candidates = (...names: string[]) => names.map((name) => ({ id: name, nameKey: foldName(name) }))

describe('an athlete is found by file name', () => {
  it.each([
    ['mara_ostrow_1.csv'],
    ['Ostrow-Mara CMJ 02.txt'],
    ['2026-03-01 MARA OSTROW.csv'],
    ['cmj.mara.ostrow.trial2.csv'],
    ['ostrowmara.csv'],
    ['MaraOstrow_3.csv'],
    ['maraostrow2.csv'],
    ['mara_ostrow2.csv'],
    ['mára_østrow.csv'],
    ['mara_ostrow'],
    ['2026.03.01 mara ostrow'],
  ])('%s is Mara Ostrow', (fileName) => {
    expect(matchAthlete(fileName, candidates('Mara Ostrow', 'Tomi Ostrow', 'Mara Lind'))).toBe('Mara Ostrow')
  })

  it('folds accents on both sides', () => {
    const squad = candidates('Zoë Łukaś', 'Ána Ruiz-Dahl', 'Sean O’Brannagh')
    expect(matchAthlete('zoe_lukas_1.csv', squad)).toBe('Zoë Łukaś')
    expect(matchAthlete('Ruiz Dahl, Ana.csv', squad)).toBe('Ána Ruiz-Dahl')
    expect(matchAthlete('anaruizdahl.csv', squad)).toBe('Ána Ruiz-Dahl')
    expect(matchAthlete('obrannagh_sean.csv', squad)).toBe('Sean O’Brannagh')
    expect(matchAthlete('za\u0301na_x.csv', squad)).toBeNull()
  })

  it('reads numbers that are part of a name', () => {
    expect(matchAthlete('athlete_12_cmj.csv', candidates('Athlete 12', 'Athlete 3'))).toBe('Athlete 12')
  })

  it('takes a name of one word', () => {
    expect(matchAthlete('pelle-1.csv', candidates('Pelle', 'Mara Ostrow'))).toBe('Pelle')
  })
})

describe('nobody is guessed', () => {
  it.each([
    ['initials', 'm_ostrow.csv', ['Mara Ostrow']],
    ['half a name', 'ostrow_1.csv', ['Mara Ostrow']],
    ['a shared surname alone', 'ostrow_2.csv', ['Mara Ostrow', 'Tomi Ostrow']],
    ['two athletes in one name', 'mara_ostrow_tomi_lind.csv', ['Mara Ostrow', 'Tomi Lind']],
    ['two athletes of one name', 'mara_ostrow.csv', ['Mara Ostrow', 'Mara Ostrow ']],
    ['a name within another athlete’s name', 'mara_ostrow_lind.csv', ['Mara Ostrow', 'Mara Ostrow Lind']],
    ['a part of a longer word', 'tamara_ostrowski.csv', ['Mara Ostrow']],
    ['one name that another begins', 'annalind.csv', ['Ann Lind']],
    ['the extension', 'recording.mara', ['Mara']],
    ['a file name without a word', '---.csv', ['Mara Ostrow']],
    ['an athlete whose name has no letter', 'x.csv', ['—']],
    ['an empty squad', 'mara_ostrow.csv', []],
  ])('%s', (_, fileName, names) => {
    const squad = names.map((name, i) => ({ id: String(i), nameKey: foldName(name) }))
    expect(matchAthlete(fileName, squad)).toBeNull()
  })

  it('answers at once for a name made so that its words fit together in endless ways', () => {
    const name = Array.from({ length: 14 }, (_, i) => 'a'.repeat(i + 1)).join(' ')
    const began = performance.now()
    expect(matchAthlete(`${'a'.repeat(190)}b.csv`, candidates(name))).toBeNull()
    expect(performance.now() - began).toBeLessThan(1000)
  })

  it('finds the longer name again where the shorter one is not in the session', () => {
    expect(matchAthlete('mara_ostrow_lind.csv', candidates('Mara Ostrow Lind', 'Tomi Ostrow'))).toBe(
      'Mara Ostrow Lind',
    )
  })
})
