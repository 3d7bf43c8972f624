import type { Role } from '../../server/people/roles.contract.ts'

/** What people read for a role. */
export const roleWords: Readonly<Record<Role, string>> = {
  helper: 'homeowner',
  tech: 'tech',
  senior: 'senior tech',
  admin: 'admin',
}

/** The roles an admin gives, and what each may do. */
export const staffRoles = [
  ['tech', 'Diagnosis, and articles for qualified people'],
  ['senior', 'the same, and writes articles, tests and rules'],
  ['admin', 'the same, and looks after people and the shop’s details'],
] as const
