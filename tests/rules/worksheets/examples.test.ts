/** The forms of the pages against the schemas of the core: every name fits, and every answer keeps to the house's words. */
import { describe, expect, test } from 'vitest'
import type { Units } from '../../../rules/worksheets/wire.ts'
import { computeWorksheet, worksheetNames } from '../../../rules/worksheets/worksheets.ts'
import type { WorksheetName } from '../../../rules/worksheets/worksheets.ts'
import { convertUnits } from '../../../src/worksheets/convert-units.ts'
import { forms } from '../../../src/worksheets/forms/forms.ts'
import { fieldsNow } from '../../../src/worksheets/forms/parts.ts'
import { readNumber, readTyped } from '../../../src/worksheets/read-typed.ts'
import { sheetList } from '../../../src/worksheets/sheet-list.ts'

const units = ['american', 'metric'] as const
const all = worksheetNames.flatMap((name) => units.map((unit) => [name, unit] as const))

const resultOf = (name: WorksheetName, values: Readonly<Record<string, string>>, unit: Units) => {
  const answer = computeWorksheet(name, readTyped(forms[name], values, unit))
  if ('errors' in answer) throw new Error(`${name}: ${JSON.stringify(answer.errors)}`)
  return answer.result
}

describe.each(all)('%s, %s', (name, unit) => {
  const form = forms[name]

  test('the example is answered, with working, references, assumptions and who decides', () => {
    const result = resultOf(name, form.example(unit), unit)
    expect(result.steps.length).toBeGreaterThan(0)
    expect(result.references.length).toBeGreaterThan(0)
    expect(result.assumptions.length).toBeGreaterThan(0)
    expect(result.cautions.at(-1)?.text).toContain('authority having jurisdiction')
  })

  test('every choice of its form leads to an answer, or to a sentence at a field that stands on the page', () => {
    const example = form.example(unit)
    for (const field of fieldsNow(form.groups(example, unit), example)) {
      if (field.kind === 'number') continue
      for (const { value } of field.ways) {
        const values = { ...example, ...field.brings?.[value], [field.name]: value }
        const answer = computeWorksheet(name, readTyped(form, values, unit))
        const there = new Set(fieldsNow(form.groups(values, unit), values).map((one) => one.name))
        for (const at of Object.keys('errors' in answer ? answer.errors : {}))
          expect([field.name, value, at, there.has(at)]).toEqual([field.name, value, at, true])
        if ('result' in answer)
          expect(JSON.stringify(answer.result)).not.toMatch(/\bsafe(?!ty)|NaN|undefined|Infinity/i)
      }
    }
  })

  test('a number that is no number is named at its field, and nowhere else', () => {
    const example = form.example(unit)
    for (const field of fieldsNow(form.groups(example, unit), example)) {
      if (field.kind !== 'number' || field.hidden === true) continue
      const answer = computeWorksheet(name, readTyped(form, { ...example, [field.name]: 'x' }, unit))
      expect('errors' in answer && Object.keys(answer.errors)).toEqual([field.name])
    }
  })

  test('changed to the other units it is still answered, and much alike', () => {
    const other = unit === 'american' ? 'metric' : 'american'
    const converted = convertUnits(form, form.example(unit), unit, other)
    expect(resultOf(name, converted, other).judgment).toBe(resultOf(name, form.example(unit), unit).judgment)
  })
})

test('the list of worksheets has each once, by its own title, and the bond audit before them', () => {
  const [audit, ...listed] = sheetList.flatMap(({ sheets }) => sheets.map(({ to, name }) => [to, name]))
  expect(audit).toEqual(['bond-audit', 'Bond audit'])
  expect(listed.sort()).toEqual(worksheetNames.map((name) => [name, forms[name].title]).sort())
})

test.each([
  ['1,000', 1000],
  ['12,345.5', 12345.5],
  ['.5', 0.5],
  [' 7 ', 7],
  ['−3', -3],
  ['', undefined],
  ['2,5', Number.NaN],
  ['1e3', Number.NaN],
  ['0x10', Number.NaN],
  ['12 ft', Number.NaN],
])('"%s" is read as %s', (text, number) => expect(readNumber(text)).toEqual(number))
