import { describe, expect, it } from 'vitest'
import { truncateAddress } from '../../../server/services/truncateAddress.ts'
import { deviceWords } from '../../../shared/devices/deviceWords.ts'

describe('deviceWords', () => {
  it.each([
    ['Mozilla/5.0 (Linux; Android 14; Pixel 8) AppleWebKit/537.36 (KHTML, like Gecko) Chrome/126.0.0.0 Mobile Safari/537.36', 'Chrome, Android'],
    ['Mozilla/5.0 (Android 14; Mobile; rv:127.0) Gecko/127.0 Firefox/127.0', 'Firefox, Android'],
    ['Mozilla/5.0 (iPhone; CPU iPhone OS 17_5 like Mac OS X) AppleWebKit/605.1.15 (KHTML, like Gecko) Version/17.5 Mobile/15E148 Safari/604.1', 'Safari, iPhone'],
    ['Mozilla/5.0 (Windows NT 10.0; Win64; x64) AppleWebKit/537.36 (KHTML, like Gecko) Chrome/126.0.0.0 Safari/537.36 Edg/126.0.0.0', 'Edge, Windows'],
    ['Mozilla/5.0 (Macintosh; Intel Mac OS X 14_5) AppleWebKit/605.1.15 (KHTML, like Gecko) Version/17.5 Safari/605.1.15', 'Safari, macOS'],
    ['curl/8.5.0', null], ['', null], [undefined, null],
  ])('%s', (header, words) => {
    expect(deviceWords(header)).toBe(words)
  })

  it('reads a header of any length quickly', () => {
    expect(deviceWords(`Version/${'1.'.repeat(50_000)} Safari/`)).toBeNull()
  })
})

describe('truncateAddress', () => {
  // Blocks for documentation: RFC 5737 (IPv4), RFC 3849 (IPv6).
  it.each([
    ['203.0.113.77', '203.0.113.0/24'], ['::ffff:203.0.113.77', '203.0.113.0/24'], ['2001:db8:85a3::8a2e:370:7334', '2001:db8:85a3::/48'],
    ['2001:0DB8:0001:2:3:4:5:6', '2001:db8:1::/48'], ['2001:db8::1', '2001:db8::/48'], ['fe80::1%eth0', 'fe80::/48'], ['::1', '::/48'], ['somewhere', null], [undefined, null],
  ])('%s lies in %s', (address, network) => {
    expect(truncateAddress(address)).toBe(network)
  })
})
