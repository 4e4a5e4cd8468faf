/** A worked example of a textbook as its published companion calculation gives it. */
import { insideFilmWPerM2K } from '#solver/convection/inside.ts'
import { published } from '../../published.ts'

published(insideFilmWPerM2K, [
  {
    from: 'Çengel 8-6, air in a square duct',
    given: { velocityMPerS: 3.75, hydraulicDiameterM: 0.2, airC: 80, pressurePa: 101325 },
    printed: '13.5',
    within: {
      fraction: 0.12,
      because:
        'the book takes 0.023 Re^0.8 Pr^0.3, good to a quarter and a tenth above the formula used here',
    },
  },
])
