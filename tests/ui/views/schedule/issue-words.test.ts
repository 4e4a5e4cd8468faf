import { expect, test } from 'vitest'
import { toDoWords } from '#ui/views/schedule/issue-words.ts'

const wrong = { column: 'size', found: '"DN 81"', allowed: 'DN 80' }
const missing = { column: 'air_c', found: 'nothing', allowed: 'a number' }

test.each([
  [[wrong], '1 value to mend'],
  [[missing], '1 value to give'],
  [[missing, missing], '2 values to give'],
  [[wrong, missing, missing, missing], '1 value to mend, 3 to give'],
])('%#: what is wrong and what is missing are counted apart', (issues, words) => {
  expect(toDoWords(issues)).toBe(words)
})
