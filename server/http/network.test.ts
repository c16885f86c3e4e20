import { describe, expect, it } from 'vitest'
import { networkOf } from './network.ts'

describe('networkOf(address)', () => {
  it('is an IPv4 address itself, however it is written', () => {
    for (const address of [
      '203.0.113.9',
      '::ffff:203.0.113.9',
      '::ffff:cb00:7109',
      '0:0:0:0:0:ffff:203.0.113.9',
    ])
      expect(networkOf(address)).toBe('203.0.113.9')
  })

  it('is the /64 of an IPv6 address, the same for all addresses in it', () => {
    for (const address of ['2001:db8:1:2::1', '2001:0DB8:0001:0002:ffff:ffff:ffff:ffff', '2001:db8:1:2:3::'])
      expect(networkOf(address)).toBe('2001:db8:1:2::/64')
    expect(networkOf('2001:db8:1:3::1')).toBe('2001:db8:1:3::/64')
    expect(networkOf('2001:db8::1')).toBe('2001:db8:0:0::/64')
    expect(networkOf('::1')).toBe('0:0:0:0::/64')
    expect(networkOf('64:ff9b::203.0.113.9')).toBe('64:ff9b:0:0::/64')
  })

  it('leaves the interface off a link-local address', () => {
    expect(networkOf('fe80::1%eth0')).toBe('fe80:0:0:0::/64')
  })

  it('is whatever else came, and one place for nothing', () => {
    expect(networkOf('unknown')).toBe('unknown')
    expect(networkOf(undefined)).toBe('')
  })
})
