import * as z from 'zod/mini'

/** Whom a file of an edition is written for. Apart from the schema, which no first page has to carry. */
export const Audience = z.enum(['everyone', 'qualified'])
export type Audience = z.infer<typeof Audience>
