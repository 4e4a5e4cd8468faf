/** Diameters, conduction forms and areas as lines. The solver's own values stand in `wallOf`. */
import { type FaceShape, wallOf } from '#solver/index.ts'
import type { Layer, Shape } from '#solver/types.ts'
import type { Ledger } from './ledger.ts'

type Of<K extends Shape['kind']> = Extract<Shape, { kind: K }>

/**
 * The wall of a shape with its layers: s_1… above, inside to outside, must stand in the ledger. Forms: flux on the outer
 * area times F_j is the integral of the conductivity over the temperature across layer j.
 */
export function geometrySteps(ledger: Ledger, shape: Shape, layers: readonly Layer[]): void {
  const wall = wallOf(shape, layers)
  const [first] = wall.faces
  if (!first) return
  const forms = first.formsM
  switch (shape.kind) {
    case 'pipe':
    case 'buried-pipe':
      diameterSteps(ledger, shape.outerDiameterM, forms.length)
      cylinderForms(ledger, forms, 'F')
      ledger.step('Outer area of a metre', 'A', `π × D_${forms.length}`, 'm²/m', {
        value: wall.outerAreaM2PerUnit,
      })
      break
    case 'sphere':
      diameterSteps(ledger, shape.outerDiameterM, forms.length)
      sphereForms(ledger, forms)
      ledger.step('Outer area', 'A', `π × D_${forms.length}^2`, 'm²', {
        value: wall.outerAreaM2PerUnit,
      })
      break
    case 'flat':
      forms.forEach((form, index) => {
        ledger.step(`Form of layer ${index + 1}`, `F_${index + 1}`, `s_${index + 1}`, 'm', {
          value: form,
        })
      })
      break
    case 'rect-duct':
      ductSteps(ledger, shape, forms, wall.faces)
      break
    case 'vessel':
      vesselSteps(ledger, shape, wall.faces, wall.outerAreaM2PerUnit)
      break
  }
}

function diameterSteps(ledger: Ledger, bareDiameterM: number, count: number): void {
  ledger.given('Outer diameter of the bare thing', 'D_0', bareDiameterM, 'm')
  for (let index = 1; index <= count; index += 1) {
    ledger.step(
      `Outer diameter over layer ${index}`,
      `D_${index}`,
      `D_${index - 1} + 2 × s_${index}`,
      'm',
    )
  }
}

const FOURIER = 'Fourier’s law'

function cylinderForms(ledger: Ledger, forms: readonly number[], symbol: string): void {
  forms.forEach((form, index) => {
    const layer = index + 1
    ledger.step(
      `Form of layer ${layer} on the outer area`,
      `${symbol}_${layer}`,
      `D_${forms.length} / 2 × ln(D_${layer} / D_${index})`,
      'm',
      { value: form, source: FOURIER },
    )
  })
}

function sphereForms(ledger: Ledger, forms: readonly number[]): void {
  forms.forEach((form, index) => {
    const layer = index + 1
    ledger.step(
      `Form of layer ${layer} on the outer area`,
      `F_${layer}`,
      `D_${forms.length}^2 / 2 × (1 / D_${index} − 1 / D_${layer})`,
      'm',
      { value: form, source: FOURIER },
    )
  })
}

const MEAN_PERIMETER =
  'ISO 12241:2022, rectangular duct, as quoted in a public building-energy model'

function ductSteps(
  ledger: Ledger,
  shape: Of<'rect-duct'>,
  forms: readonly number[],
  faces: readonly FaceShape[],
): void {
  ledger.given('Width', 'W', shape.widthM, 'm')
  ledger.given('Height', 'H', shape.heightM, 'm')
  ledger.step('Perimeter of the bare duct', 'P_0', '2 × (W + H)', 'm')
  forms.forEach((_, index) => {
    const layer = index + 1
    ledger.step(`Perimeter over layer ${layer}`, `P_${layer}`, `P_${index} + 8 × s_${layer}`, 'm')
  })
  const outer = `P_${forms.length}`
  forms.forEach((form, index) => {
    const layer = index + 1
    ledger.step(
      `Form of layer ${layer} on the outer area, by the mean perimeter`,
      `F_${layer}`,
      `${outer} × 2 × s_${layer} / (P_${index} + P_${layer})`,
      'm',
      { value: form, source: MEAN_PERIMETER },
    )
  })
  const total = forms.map((_, index) => `2 × s_${index + 1}`)
  ledger.step('Outer width', 'W_e', ['W', ...total].join(' + '), 'm')
  ledger.step('Outer height', 'H_e', ['H', ...total].join(' + '), 'm')
  ledger.step('Outer area of a metre', 'A', outer, 'm²/m')
  if (faces.length > 1) {
    ledger.step('Share of the two sides', 'a_1', `2 × H_e / ${outer}`, '', {
      value: faces[0]?.share ?? 0,
    })
    ledger.step('Share of the top', 'a_2', `W_e / ${outer}`, '', { value: faces[1]?.share ?? 0 })
    ledger.step('Share of the bottom', 'a_3', `W_e / ${outer}`, '', { value: faces[2]?.share ?? 0 })
  }
}

/** Radius of the half sphere with the area of a domed head, by the vessel's diameter. */
export const DOME_FORMULA =
  'sqrt((1 + 0.25 / sqrt(0.75) × 0.5 × ln((1 + sqrt(0.75)) / (1 − sqrt(0.75)))) / 8)'

function vesselSteps(
  ledger: Ledger,
  shape: Of<'vessel'>,
  faces: readonly FaceShape[],
  areaM2: number,
): void {
  const [shell, head] = faces
  const count = shell?.formsM.length ?? 0
  diameterSteps(ledger, shape.outerDiameterM, count)
  ledger.given('Length of the shell', 'L_0', shape.shellLengthM, 'm')
  cylinderForms(ledger, shell?.formsM ?? [], 'F')
  const headForms = head?.formsM ?? []
  if (shape.heads === 'domed') {
    ledger.step(
      'Radius of the half sphere as large as a head, by the diameter',
      'k',
      DOME_FORMULA,
      '',
      {
        source: 'geometry of the half ellipsoid half as high as wide',
      },
    )
    ledger.step('Radius of that half sphere', 'r_0', 'k × D_0', 'm')
    headForms.forEach((_, index) => {
      ledger.step(
        `Radius over layer ${index + 1}`,
        `r_${index + 1}`,
        `r_${index} + s_${index + 1}`,
        'm',
      )
    })
    headForms.forEach((form, index) => {
      ledger.step(
        `Form of layer ${index + 1} at the heads`,
        `G_${index + 1}`,
        `r_${count}^2 × (1 / r_${index} − 1 / r_${index + 1})`,
        'm',
        { value: form, source: FOURIER },
      )
    })
    ledger.step('Outer area of a head', 'A_h', `2 × π × r_${count}^2`, 'm²')
  } else {
    headForms.forEach((form, index) => {
      ledger.step(
        `Form of layer ${index + 1} at the heads`,
        `G_${index + 1}`,
        `s_${index + 1}`,
        'm',
        {
          value: form,
        },
      )
    })
    ledger.step('Outer area of a head', 'A_h', `π / 4 × D_${count}^2`, 'm²')
  }
  ledger.step('Outer area of the shell', 'A_s', `π × D_${count} × L_0`, 'm²')
  ledger.step('Outer area', 'A', 'A_s + 2 × A_h', 'm²', { value: areaM2 })
  faces.forEach((face, index) => {
    const isShell = index === 0
    const heads = faces.length === 2 ? '2 × A_h' : 'A_h'
    ledger.step(
      `Share of the ${face.side}`,
      `a_${index + 1}`,
      `${isShell ? 'A_s' : heads} / A`,
      '',
      {
        value: face.share,
      },
    )
  })
}
