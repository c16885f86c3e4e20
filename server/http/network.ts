import { isIPv4, isIPv6 } from 'node:net'

/**
 * What counts as one place on the network when tries are limited: an IPv4 address, or the /64 of an IPv6 one, since
 * every subscriber has at least that many addresses to call from (RFC 6177). Anything else is its own place.
 */
export function networkOf(address: string | undefined): string {
  const ip = (address ?? '').replace(/%.*$/, '')
  if (isIPv4(ip) || !isIPv6(ip)) return ip
  const parts = hextets(ip)
  const mapped = parts.slice(0, 6).join(':') === '0:0:0:0:0:ffff'
  return mapped ? dotted(parts.slice(6)) : `${parts.slice(0, 4).join(':')}::/64`
}

/** The eight parts of an IPv6 address, without leading zeros. */
function hextets(ip: string): string[] {
  const [head = '', tail] = ip.replace(/\d+(?:\.\d+){3}$/, asHextets).split('::')
  const [before, after] = [head, tail ?? ''].map((part) => (part === '' ? [] : part.split(':')))
  const gap = Array.from({ length: 8 - before.length - after.length }, () => '0')
  return [...before, ...(tail === undefined ? [] : gap), ...after].map((part) =>
    parseInt(part, 16).toString(16),
  )
}

function asHextets(dottedQuad: string): string {
  const [a = 0, b = 0, c = 0, d = 0] = dottedQuad.split('.').map(Number)
  return `${(a * 256 + b).toString(16)}:${(c * 256 + d).toString(16)}`
}

const dotted = (parts: string[]): string =>
  parts
    .map((part) => parseInt(part, 16))
    .flatMap((part) => [part >> 8, part & 255])
    .join('.')
