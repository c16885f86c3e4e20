import { SaxesParser } from 'saxes'
import { ReadFault } from '../errors.ts'

export interface XmlHandlers {
  /** Names without their prefix: writers differ in it. */
  open?: (name: string, attributes: Record<string, string>) => void
  text?: (text: string) => void
  close?: (name: string) => void
}

/** Bytes given to the parser at once. */
const PIECE = 64 * 1024

const plainName = (name: string): string => name.slice(name.indexOf(':') + 1)

function decoderFor(bytes: Uint8Array): TextDecoder {
  if (bytes[0] === 0xff && bytes[1] === 0xfe) return new TextDecoder('utf-16le')
  if (bytes[0] === 0xfe && bytes[1] === 0xff) return new TextDecoder('utf-16be')
  return new TextDecoder('utf-8')
}

/**
 * Walks through one part of a workbook. Entities that a document declares are never unfolded: no part of a workbook
 * declares any.
 * @throws ReadFault `corrupt-file` where the part is no well-formed XML, or declares a document type
 */
export function readXml(bytes: Uint8Array, part: string, { open, text, close }: XmlHandlers): void {
  const parser = new SaxesParser<{ xmlns: false }>({ xmlns: false })
  const damaged = (): never => {
    throw new ReadFault('corrupt-file', `The workbook is damaged: its part “${part}” cannot be read.`, {
      seen: part,
    })
  }
  parser.on('error', damaged)
  parser.on('doctype', damaged)
  if (open) parser.on('opentag', ({ name, attributes }) => open(plainName(name), attributes))
  if (close) parser.on('closetag', ({ name }) => close(plainName(name)))
  if (text) {
    parser.on('text', text)
    parser.on('cdata', text)
  }
  const decoder = decoderFor(bytes)
  for (let at = 0; at < bytes.length; at += PIECE)
    parser.write(decoder.decode(bytes.subarray(at, at + PIECE), { stream: true }))
  parser.write(decoder.decode()).close()
}
