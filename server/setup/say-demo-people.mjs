import { readFileSync } from 'node:fs'
import { join } from 'node:path'
import { root } from './places.mjs'

const roles = { helper: 'homeowner', tech: 'tech', senior: 'senior tech', admin: 'admin' }

/** Prints who can sign in on the private database, and with what; and the sheets they have, with a homeowner's link. */
export function sayDemoPeople() {
  const people = JSON.parse(readFileSync(join(root, 'server/people/demo-people.json'), 'utf8'))
  console.log('Demo people, on this private database alone:')
  for (const { email, role, password } of people)
    console.log(`  ${roles[role].padEnd(12)}${email.padEnd(24)}${password}`)
  const sheets = JSON.parse(readFileSync(join(root, 'server/sheets/demo-sheets.json'), 'utf8'))
  console.log('Their findings sheets:')
  for (const { by, title, link } of sheets)
    console.log(
      `  ${roles[by].padEnd(12)}${title}${link === undefined ? '' : `; a tech opens it at /sheets/${link}`}`,
    )
}
