/** An id made on the device, a UUID of 122 random bits. `crypto.randomUUID` is missing on plain HTTP, this is not. */
export function newId(): string {
  const bytes = crypto.getRandomValues(new Uint8Array(16))
  bytes[6] = (bytes[6]! & 0x0f) | 0x40
  bytes[8] = (bytes[8]! & 0x3f) | 0x80
  return hexOf(bytes).replace(/^(.{8})(.{4})(.{4})(.{4})(.{12})$/, '$1-$2-$3-$4-$5')
}

/** A secret made on the device: 256 random bits, in hexadecimal digits. */
export const newSecret = (): string => hexOf(crypto.getRandomValues(new Uint8Array(32)))

const hexOf = (bytes: Uint8Array): string =>
  [...bytes].map((byte) => byte.toString(16).padStart(2, '0')).join('')
