import * as z from 'zod/mini'

/** A moment, as ISO 8601 in UTC. */
export const Moment = z.iso.datetime()
/** Made on the device. */
export const Id = z
  .string('Name an id.')
  .check(z.regex(/^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$/, 'An id is a UUID.'))
export const Hash = z.string().check(z.regex(/^[0-9a-f]{64}$/))
/** An id of the edition's. */
export const Name = z.string().check(z.minLength(1), z.maxLength(80))
export const Kind = z.enum(['triage', 'diagnosis'])
