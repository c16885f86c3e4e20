import { mkdtempSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { describe, expect, it } from 'vitest'
import { analysedProtocols } from '../../shared/mechanics/protocols/analysed.ts'
import { defaultSettings } from '../../shared/mechanics/settings.ts'
import { UsageError, readArguments } from './analyse-arguments.ts'

function settingsFile(text: string): string {
  const path = join(mkdtempSync(join(tmpdir(), 'underfoot-')), 'settings.json')
  writeFileSync(path, text)
  return path
}

describe('readArguments', () => {
  it('takes files in any place and leaves the test to the engine', () => {
    const { files, given, settings, summary } = readArguments(['a.csv', '--summary', 'b.csv'])
    expect(files).toStrictEqual(['a.csv', 'b.csv'])
    expect(given).toStrictEqual({})
    expect(settings).toBe(defaultSettings)
    expect(summary).toBe(true)
  })

  it('makes a test of protocol, side and load', () => {
    const { given } = readArguments([
      'a.csv',
      '--protocol',
      'cmj',
      '--side',
      'left',
      '--load',
      '20',
      '--mass',
      '81.5',
      '--rate',
      '500',
    ])
    expect(given).toMatchObject({
      test: { protocol: 'cmj', side: 'left', externalLoadKg: 20 },
      massKg: 81.5,
      sampleRateHz: 500,
    })
  })

  it('keeps what is known of a test that is not named', () => {
    const { given } = readArguments(['a.csv', '--load', '20', '--side', 'right', '--box', '0.4'])
    expect(given).toStrictEqual({ known: { externalLoadKg: 20, side: 'right', boxHeightM: 0.4 } })
  })

  it('takes every test that the engine analyses', () => {
    for (const protocol of analysedProtocols)
      expect(readArguments(['a.csv', '--protocol', protocol]).given.test?.protocol).toBe(protocol)
  })

  it('reads a column map', () => {
    const map = {
      time: null,
      forces: [{ index: 0, name: 'F', unit: 'N', channel: 'single' }],
      sampleRateHz: 500,
    }
    expect(readArguments(['a.csv', '--map', settingsFile(JSON.stringify(map))]).given).toStrictEqual({ map })
  })

  it('changes settings by name', () => {
    const path = settingsFile('{ "eventForceN": 20, "onsetRule": "standard-deviations" }')
    const { settings } = readArguments(['a.csv', '--settings', path])
    expect(settings).toStrictEqual({ ...defaultSettings, eventForceN: 20, onsetRule: 'standard-deviations' })
  })

  it.each([
    [[], 'Name at least one file.'],
    [['a.csv', '--rate', 'fast'], '--rate takes a number'],
    [['a.csv', '--mass', '4'], '--mass takes a number from 10 to 400'],
    [['a.csv', '--protocol', 'sprint'], '--protocol takes cmj'],
    [['a.csv', '--box', '40'], '--box takes a number from 0.01 to 2'],
    [['a.csv', '--side', 'front'], '--side takes both, left or right'],
    [['a.csv', '--colour'], "Unknown option '--colour'"],
    [['a.csv', '--settings', '/no/such/file'], 'could not be read as JSON'],
    [['a.csv', '--map', settingsFile('{ "time": null, "forces": [] }')], 'is no column map: forces'],
    [['a.csv', '--settings', settingsFile('[1]')], 'must hold an object'],
    [['a.csv', '--settings', settingsFile('{ "eventForce": 1 }')], '“eventForce” is no setting'],
    [['a.csv', '--settings', settingsFile('{ "eventForceN": "ten" }')], 'cannot be "ten"'],
  ])('refuses %j in words', (args, words) => {
    expect(() => readArguments(args)).toThrow(UsageError)
    expect(() => readArguments(args)).toThrow(words)
  })
})
