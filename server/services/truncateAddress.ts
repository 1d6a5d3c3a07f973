import { isIPv4, isIPv6 } from 'node:net'

const KEPT_GROUPS = 3
const ALL_GROUPS = 8

/**
 * The network that an address lies in, `203.0.113.0/24` or `2001:db8:1::/48`: enough to tell the farm from elsewhere, too little to
 * tell one household of a provider from another. An IPv4 address in IPv6 clothes is taken as what it is. Null for what is no address.
 */
export function truncateAddress(address: string | undefined): string | null {
  const bare = (address ?? '').replace(/^::ffff:(?=\d+\.)/i, '').replace(/%.*$/, '')
  if (isIPv4(bare)) return `${bare.split('.').slice(0, 3).join('.')}.0/24`
  if (!isIPv6(bare)) return null
  const [before = '', after = ''] = bare.split('::')
  const head = before.split(':').filter((group) => group !== '')
  const tail = after.split(':').filter((group) => group !== '')
  const gap = Array.from({ length: Math.max(0, ALL_GROUPS - head.length - tail.length) }, () => '0')
  const kept = [...head, ...gap, ...tail].slice(0, KEPT_GROUPS).map((group) => Number.parseInt(group, 16).toString(16))
  while (kept.at(-1) === '0') kept.pop()
  return `${kept.join(':')}::/48`
}
