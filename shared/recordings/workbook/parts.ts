import { ReadFault } from '../errors.ts'
import { numberKind, type NumberKind } from './number-format.ts'
import { readXml } from './xml.ts'

/** The bytes of a part by its path in the package, null where there is none. */
export type PartOf = (path: string) => Uint8Array | null

export interface SheetPlace {
  name: string
  isHidden: boolean
  path: string
}

export interface WorkbookParts {
  sheets: SheetPlace[]
  /** Days are counted from 1904. */
  is1904: boolean
  strings: string[]
  /** What numbers are, by the style of their cell. */
  styles: NumberKind[]
}

/** ECMA-376 fixes no names; every program writes these. */
const WORKBOOK = 'xl/workbook.xml'
const RELATIONS = 'xl/_rels/workbook.xml.rels'

interface Relation {
  /** The last part of its type's address. */
  type: string
  path: string
}

/** `worksheets/sheet1.xml` stands in the workbook's folder, `/xl/worksheets/sheet1.xml` in the package. */
const inPackage = (target: string): string =>
  target.startsWith('/') ? target.slice(1) : `xl/${target.replace(/^\.\//u, '')}`

function readRelations(partOf: PartOf): Map<string, Relation> {
  const relations = new Map<string, Relation>()
  const bytes = partOf(RELATIONS)
  if (!bytes) return relations
  readXml(bytes, RELATIONS, {
    open: (name, { Id, Type, Target, TargetMode }) => {
      // A target outside the package is never followed.
      if (name !== 'Relationship' || !Id || !Target || TargetMode === 'External') return
      relations.set(Id, { type: (Type ?? '').split('/').at(-1) ?? '', path: inPackage(Target) })
    },
  })
  return relations
}

/** Texts that cells refer to by number; of each its runs, without the reading aids of East Asian scripts. */
export function readStrings(bytes: Uint8Array, part: string): string[] {
  const strings: string[] = []
  let text = ''
  let inText = false
  let inPhonetic = false
  readXml(bytes, part, {
    open: (name) => {
      if (name === 'si') text = ''
      else if (name === 'rPh') inPhonetic = true
      else if (name === 't') inText = !inPhonetic
    },
    text: (piece) => {
      if (inText) text += piece
    },
    close: (name) => {
      if (name === 't') inText = false
      else if (name === 'rPh') inPhonetic = false
      else if (name === 'si') strings.push(text)
    },
  })
  return strings
}

/** The kind of number of each style that cells refer to. */
export function readStyles(bytes: Uint8Array, part: string): NumberKind[] {
  const codes = new Map<number, string>()
  const kinds: NumberKind[] = []
  let inCellFormats = false
  readXml(bytes, part, {
    open: (name, { numFmtId, formatCode }) => {
      const id = Number(numFmtId ?? 0)
      if (name === 'numFmt') codes.set(id, formatCode ?? '')
      else if (name === 'cellXfs') inCellFormats = true
      else if (name === 'xf' && inCellFormats) kinds.push(numberKind(id, codes.get(id)))
    },
    close: (name) => {
      if (name === 'cellXfs') inCellFormats = false
    },
  })
  return kinds
}

/**
 * What every sheet of a workbook needs to be read: its place, the texts, the formats.
 * @throws ReadFault `corrupt-file`
 */
export function readParts(partOf: PartOf): WorkbookParts {
  const bytes = partOf(WORKBOOK)
  if (!bytes)
    throw new ReadFault('corrupt-file', `The workbook is damaged: its part “${WORKBOOK}” is missing.`)
  const relations = readRelations(partOf)
  const sheets: SheetPlace[] = []
  let is1904 = false
  readXml(bytes, WORKBOOK, {
    open: (name, attributes) => {
      if (name === 'workbookPr') is1904 = /^(?:1|true)$/u.test(attributes['date1904'] ?? '')
      if (name !== 'sheet') return
      const id = Object.entries(attributes).find(([key]) => key === 'id' || key.endsWith(':id'))?.[1] ?? ''
      const relation = relations.get(id)
      if (relation?.type !== 'worksheet') return
      const { state } = attributes
      sheets.push({
        name: attributes['name'] ?? '',
        isHidden: state === 'hidden' || state === 'veryHidden',
        path: relation.path,
      })
    },
  })
  const first = <T>(type: string, read: (bytes: Uint8Array, part: string) => T[]): T[] => {
    const path = [...relations.values()].find((relation) => relation.type === type)?.path
    const part = path === undefined ? null : partOf(path)
    return part && path !== undefined ? read(part, path) : []
  }
  return { sheets, is1904, strings: first('sharedStrings', readStrings), styles: first('styles', readStyles) }
}
