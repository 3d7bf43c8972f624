/** An id made on the device: 128 random bits. `crypto.randomUUID` is missing on plain HTTP, this is not. */
export function newId(): string {
  const bytes = crypto.getRandomValues(new Uint8Array(16))
  return [...bytes].map((byte) => byte.toString(16).padStart(2, '0')).join('')
}
