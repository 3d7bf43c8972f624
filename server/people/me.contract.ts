import * as z from 'zod/mini'
import { Role } from './roles.contract.ts'

export const Person = z.object({ id: z.uuid(), email: z.string(), name: z.string(), role: Role })
/** GET /api/me, and the answer of whatever signs a person in or out. Null: nobody is signed in. */
export const Me = z.object({ person: z.nullable(Person) })

export type Person = z.infer<typeof Person>
export type Me = z.infer<typeof Me>
