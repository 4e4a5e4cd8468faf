/**
 * The works that the tests compare with. A row's `from` begins with one of a work's beginnings, so that a work counts
 * once, however many of its tables and examples are used, and whoever quotes it.
 */
interface Work {
  readonly name: string
  readonly begins: readonly string[]
}

const textbook = (name: string, begins: string): Work => ({ name, begins: [begins] })

const works: readonly Work[] = [
  {
    name: 'ASHRAE Handbook, Fundamentals (2017, 2021)',
    begins: ['ASHRAE Handbook Fundamentals'],
  },
  {
    name: 'Lemmon and Jacobsen 2004, viscosity and conductivity of air',
    begins: ['Lemmon and Jacobsen 2004'],
  },
  {
    name: 'BS 5422:2023, table 20A, as quoted in an open-source hot-water model',
    begins: ['BS 5422:2023'],
  },
  { name: 'German Building Energy Act, annex 8', begins: ['German Building Energy Act'] },
  { name: 'Italian DPR 412/1993, annex B', begins: ['Italian DPR 412/1993'] },
  {
    name: 'BS 5422:1990, dew-point table, as printed in the Thermal Insulation Handbook',
    begins: ['BS 5422'],
  },
  {
    name: 'Thermal Insulation Handbook (Southern Africa, 2001)',
    begins: ['Thermal Insulation Handbook', 'TIASA Thermal Insulation Handbook'],
  },
  {
    name: 'US government tip sheets on steam',
    begins: ['US government tip sheet', 'US government steam tip sheet'],
  },
  {
    name: 'Forensic engineering article on frozen pipes',
    begins: ['a forensic engineering article', 'the same article'],
  },
  {
    name: 'Reference texts of a public heat-transfer library',
    begins: [
      'reference text of a public heat-transfer library',
      'check value of a public heat-transfer library',
      'check values of a public heat-transfer library',
    ],
  },
  {
    name: 'German accident-insurance rule quoting DIN EN 563:1994',
    begins: ['German accident-insurance rule'],
  },
  {
    name: 'Academic appendix quoting DIN EN 563',
    begins: ['academic appendix quoting DIN EN 563'],
  },
  {
    name: 'Published summaries of EN ISO 13732-1:2009 and GB/T 18153-2000',
    begins: ['published summaries of EN ISO 13732-1'],
  },
  {
    name: 'Technical note on hot water and surfaces',
    begins: ['technical note on hot water and surfaces'],
  },
  {
    name: 'Public text with a reading of the figures of ISO 13732-1',
    begins: ['figure reading of ISO 13732-1'],
  },
  { name: 'Psychrometric library of the npm registry', begins: ['psychrolib 1.1.1'] },
  {
    name: 'Fundamentals Handbook, Heat Transfer, of the US Department of Energy',
    begins: ['US Department of Energy, Fundamentals Handbook, Heat Transfer'],
  },
  {
    name: 'Exercise sheets of universities, with their answers',
    begins: ['university exercise'],
  },
  {
    name: 'Fishenden and Saunders, An Introduction to Heat Transfer',
    begins: ['Fishenden and Saunders'],
  },
  {
    name: "Mechanical Engineer's Data Handbook",
    begins: ["Mechanical Engineer's Data Handbook"],
  },
  {
    name: "Mechanical Engineers' Handbook, volume 4",
    begins: ["Mechanical Engineers' Handbook"],
  },
  {
    name: 'Carroll, Lo and Stiel 1968, conductivity of gaseous air',
    begins: ['Carroll, Lo and Stiel 1968'],
  },
  { name: 'Book of Engineering', begins: ['Book of Engineering'] },
  { name: 'IAPWS R14-08, sublimation and melting of ice', begins: ['IAPWS R14-08'] },
  {
    name: 'Public table of the vapour pressure of water',
    begins: ['public table of the vapour pressure of water'],
  },
  { name: 'Manual of a hygrometer', begins: ["hygrometer's manual"] },
  { name: 'Climate table of humidity and dew point', begins: ['climate table'] },
  {
    name: 'Engineering handbook of the web, heat losses of pipes',
    begins: ['engineering handbook of the web'],
  },
  { name: 'CODATA 2018', begins: ['CODATA 2018'] },
  { name: 'NIST SP 811 (2008)', begins: ['NIST SP 811'] },
  { name: 'ISO 80000-5:2007', begins: ['ISO 80000-5'] },
  { name: 'IAPWS-IF97', begins: ['IAPWS-IF97'] },
  { name: 'Melinder 2010, properties of secondary fluids', begins: ['Melinder 2010'] },
  {
    name: 'Property tables of air, water and steam',
    begins: ['dry air at 300 K', 'water at 25 °C', 'steam tables'],
  },
  {
    name: 'Mineral heat-transfer oil, of no named make',
    begins: ['generic mineral heat-transfer oil'],
  },
  { name: 'ASTM C1129', begins: ['ASTM C1129'] },
  {
    name: 'Hydraulic Institute, engineering data book',
    begins: ['computed from ASME B16.5 dimensions in the Hydraulic Institute'],
  },
  { name: 'ISO 12241 annex A and VDI 2055', begins: ['ISO 12241 annex A'] },
  {
    name: 'Compound-interest tables of engineering economy',
    begins: ['compound-interest tables'],
  },
  textbook('Çengel, Cimbala and Turner, Fundamentals of Thermal-Fluid Sciences', 'Çengel, Cimbala'),
  // After the book above, whose beginning is longer.
  {
    name: 'Çengel, Heat and Mass Transfer',
    begins: ['Çengel, Heat and Mass Transfer', 'Çengel'],
  },
  textbook('Coulson and Richardson, Chemical Engineering, volume 1', 'Coulson and Richardson'),
  textbook('Dutta, Heat Transfer', 'Dutta'),
  textbook('Gavhane, Heat Transfer', 'Gavhane'),
  textbook('Geankoplis, Transport Processes', 'Geankoplis'),
  textbook('Granet and Bluestein, Thermodynamics and Heat Power', 'Granet'),
  textbook('Holman, Heat Transfer', 'Holman'),
  textbook('Incropera et al., Fundamentals of Heat and Mass Transfer', 'Incropera'),
  textbook('Jakob and Hawkins, Elements of Heat Transfer', 'Jakob and Hawkins'),
  textbook('Kern, Process Heat Transfer', 'Kern'),
  textbook('Kreith, Manglik and Bohn, Principles of Heat Transfer', 'Kreith'),
  textbook('Moran and Shapiro, Fundamentals of Engineering Thermodynamics', 'Moran'),
  textbook('Murphy and McKay, Energy Management', 'Murphy and McKay'),
  textbook('Sachdeva, Fundamentals of Engineering Heat and Mass Transfer', 'Sachdeva'),
  textbook('Som, Introduction to Heat Transfer', 'Som'),
  textbook('Sukhatme, A Textbook on Heat Transfer', 'Sukhatme'),
  textbook('Theodore, Heat Transfer Applications', 'Theodore'),
]

/** The work that a row's `from` names, and where in it; null where the list has no such work. */
export function workOf(from: string): { readonly work: string; readonly where: string } | null {
  for (const { name, begins } of works) {
    const beginning = begins.find((words) => from.startsWith(words))
    if (beginning === undefined) continue
    return { work: name, where: from.slice(beginning.length).replace(/^[\s,]+/, '') }
  }
  return null
}
