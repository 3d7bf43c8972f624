import * as z from 'zod/mini'

/** `helper` is a homeowner, or whoever helps them; the others are staff, each with what the one before may do. */
export const Role = z.enum(['helper', 'tech', 'senior', 'admin'])
export type Role = z.infer<typeof Role>

const staff: readonly Role[] = ['tech', 'senior', 'admin']

/** Whether a role may do what `least` may. A homeowner stands apart: staff do not act as homeowners. */
export const reaches = (role: Role, least: Role): boolean =>
  role === least || (staff.includes(least) && staff.indexOf(role) >= staff.indexOf(least))

/** Whether what is written for qualified people may be shown. Undefined: nobody is signed in. */
export const isQualified = (role: Role | undefined): boolean => role !== undefined && reaches(role, 'tech')
