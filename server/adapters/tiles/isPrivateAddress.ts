import { BlockList, isIPv6 } from 'node:net'

/** Networks that no public service answers from. @source IANA special-use address registries for IPv4 (RFC 6890) and IPv6. */
const V4 = [
  ['0.0.0.0', 8], ['10.0.0.0', 8], ['100.64.0.0', 10], ['127.0.0.0', 8], ['169.254.0.0', 16], ['172.16.0.0', 12], ['192.0.0.0', 24], ['192.0.2.0', 24],
  ['192.168.0.0', 16], ['198.18.0.0', 15], ['198.51.100.0', 24], ['203.0.113.0', 24], ['224.0.0.0', 4], ['240.0.0.0', 4],
] as const
const V6 = [['::', 127], ['64:ff9b:1::', 48], ['100::', 64], ['2001:db8::', 32], ['fc00::', 7], ['fe80::', 10], ['ff00::', 8]] as const

const private4 = new BlockList()
for (const [network, prefix] of V4) private4.addSubnet(network, prefix, 'ipv4')
const private6 = new BlockList()
for (const [network, prefix] of V6) private6.addSubnet(network, prefix, 'ipv6')

/** Whether an address lies in a private, local or reserved network; an IPv4 address in IPv6 clothes is judged as what it is. */
export function isPrivateAddress(address: string): boolean {
  if (!isIPv6(address)) return private4.check(address, 'ipv4')
  const mapped = /^::ffff:(\d+\.\d+\.\d+\.\d+)$/i.exec(address)?.[1]
  return mapped === undefined ? private6.check(address, 'ipv6') : private4.check(mapped, 'ipv4')
}
