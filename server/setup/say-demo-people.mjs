import { readFileSync } from 'node:fs'
import { join } from 'node:path'
import { root } from './places.mjs'

const roles = { helper: 'homeowner', tech: 'tech', senior: 'senior tech', admin: 'admin' }

/** Prints who can sign in on the private database, and with what. */
export function sayDemoPeople() {
  const people = JSON.parse(readFileSync(join(root, 'server/people/demo-people.json'), 'utf8'))
  console.log('Demo people, on this private database alone:')
  for (const { email, role, password } of people)
    console.log(`  ${roles[role].padEnd(12)}${email.padEnd(24)}${password}`)
}
