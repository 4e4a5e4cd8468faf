/** The bibliography: every correlation names one of these keys, so that a screen or a report can cite it. */
export const sources = {
  ashrae2021ch1: 'ASHRAE Handbook Fundamentals 2021 (SI), chapter 1, Psychrometrics',
  ashrae2021ch4: 'ASHRAE Handbook Fundamentals 2021 (SI), chapter 4, Heat Transfer',
  ashrae2021ch23:
    'ASHRAE Handbook Fundamentals 2021 (SI), chapter 23, Insulation for Mechanical Systems',
  churchillChu1975cylinder:
    'Churchill and Chu 1975, laminar and turbulent free convection from a horizontal cylinder',
  churchillChu1975plate:
    'Churchill and Chu 1975, laminar and turbulent free convection from a vertical plate',
  churchillBernstein1977:
    'Churchill and Bernstein 1977, forced convection to a circular cylinder in crossflow',
  churchill1983sphere: 'Churchill 1983, free convection around immersed bodies: sphere',
  clearSkySwinbank1963:
    'Swinbank 1963, clear-sky temperature from air temperature; coefficient from memory',
  gnielinski1976:
    'Gnielinski 1976, turbulent pipe flow, with the friction of ASHRAE Handbook Fundamentals 2021 (SI), chapter 4',
  hylandWexler1983:
    'Hyland and Wexler 1983, as ASHRAE Handbook Fundamentals 2021 (SI), chapter 1, eqs. 5 and 6',
  incropera: 'Incropera, DeWitt, Bergman and Lavine, Fundamentals of Heat and Mass Transfer',
  iso12241duct: 'ISO 12241:2022, rectangular duct, as quoted in a public building-energy model',
  iso12241form: 'ISO 12241 form, from memory, verify',
  leFevreEde1956:
    'Le Fevre and Ede 1956, free convection from the outer surface of a vertical cylinder',
  lemmonJacobsen2004:
    'Lemmon and Jacobsen 2004, viscosity and thermal conductivity of air (dilute gas)',
  whitaker1972:
    'Whitaker 1972, forced convection for flow past spheres, as ASHRAE Handbook Fundamentals 2021 (SI), chapter 4',
  airHeatCapacityFit:
    'Polynomial of c_p of air, 200 to 1000 K, from memory; agrees with printed tables to 0.2 %',
} as const

export type SourceKey = keyof typeof sources
