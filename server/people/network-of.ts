import { isIPv6 } from 'node:net'

/** The eight groups of an IPv6 address, written out. */
function groupsOf(address: string): string[] {
  const [head = '', tail] = address.split('::')
  const before = head === '' ? [] : head.split(':')
  const after = tail === undefined || tail === '' ? [] : tail.split(':')
  const gap = tail === undefined ? 0 : Math.max(0, 8 - before.length - after.length)
  return [...before, ...Array.from({ length: gap }, () => '0'), ...after].map((group) =>
    group.toLowerCase().replace(/^0+(?=.)/, ''),
  )
}

/**
 * What counts as one asker: an IPv4 address, or the /64 network of an IPv6 address, since each home holds a whole one
 * and could change its address with every try.
 */
export function networkOf(address: string | undefined): string {
  if (address === undefined) return 'unknown'
  const plain = address.replace(/%.*$/, '')
  const mapped = /^::ffff:(\d+\.\d+\.\d+\.\d+)$/i.exec(plain)?.[1]
  if (mapped !== undefined) return mapped
  return isIPv6(plain) ? `${groupsOf(plain).slice(0, 4).join(':')}::/64` : plain
}
