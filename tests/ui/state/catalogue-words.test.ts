import { expect, test } from 'vitest'
import { CatalogueWords } from '#ui/state/catalogue-words.ts'
import { shippedCatalogue } from '../../catalogue/shipped-catalogue.ts'

test.each(['Stainless', 'stainless', 'STAINLESS STEEL sheet', 'Stainless steel sheet'])(
  'a finish named "%s" is kept by its id and shown by its name',
  (typed) => {
    const words = new CatalogueWords(shippedCatalogue())
    expect(words.idOf('finish', typed)).toBe('stainless')
    expect(words.nameOf('finish', typed)).toBe('Stainless steel sheet')
  },
)
