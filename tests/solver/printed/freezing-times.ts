/**
 * ASHRAE Handbook Fundamentals 2021 (SI), chapter 23, table 6: hours in which still water cools to 0 °C in an insulated
 * pipe, conductivity 0.0432 W/(m·K), wall and outer film neglected.
 *
 * Bores are those of schedule 40. Diameters of the sections are those of table 13 in the same chapter; the five that it
 * lacks (13 mm, and 25 mm on sizes 250 and 300) are of the ASTM C585 series, from memory.
 */
export interface FreezingTime {
  readonly sizeMm: number
  readonly sectionMm: number
  readonly boreMm: number
  readonly sectionInnerMm: number
  readonly sectionOuterMm: number
  readonly hours: string
}

const row = (
  sizeMm: number,
  sectionMm: number,
  boreMm: number,
  sectionInnerMm: number,
  sectionOuterMm: number,
  hours: string,
): FreezingTime => ({ sizeMm, sectionMm, boreMm, sectionInnerMm, sectionOuterMm, hours })

export const freezingTimes: readonly FreezingTime[] = [
  row(15, 13, 15.76, 22, 48.3, '0.1'),
  row(15, 25, 15.76, 22, 73, '0.2'),
  row(15, 50, 15.76, 22, 127, '0.3'),
  row(25, 13, 26.64, 34, 60.3, '0.3'),
  row(25, 38, 26.64, 34, 114, '0.5'),
  row(25, 50, 26.64, 34, 141, '0.6'),
  row(40, 13, 40.94, 49, 73, '0.4'),
  row(40, 25, 40.94, 49, 102, '0.8'),
  row(40, 50, 40.94, 49, 168, '1.3'),
  row(40, 75, 40.94, 49, 219, '1.5'),
  row(50, 25, 52.48, 61, 114, '1.1'),
  row(50, 38, 52.48, 61, 141, '1.4'),
  row(50, 75, 52.48, 61, 219, '2.2'),
  row(50, 100, 52.48, 61, 273, '2.5'),
  row(80, 25, 77.92, 90, 141, '1.7'),
  row(80, 38, 77.92, 90, 168, '2.3'),
  row(80, 75, 77.92, 90, 244, '3.7'),
  row(80, 100, 77.92, 90, 298, '4.5'),
  row(100, 25, 102.26, 115, 168, '2.4'),
  row(100, 38, 102.26, 115, 194, '3.3'),
  row(100, 75, 102.26, 115, 273, '5.5'),
  row(100, 100, 102.26, 115, 324, '6.6'),
  row(125, 25, 128.2, 143, 194, '3.0'),
  row(125, 38, 128.2, 143, 219, '4.3'),
  row(125, 75, 128.2, 143, 298, '7.4'),
  row(125, 100, 128.2, 143, 356, '9.1'),
  row(150, 25, 154.08, 170, 219, '3.7'),
  row(150, 38, 154.08, 170, 244, '5.3'),
  row(150, 75, 154.08, 170, 324, '9.4'),
  row(150, 100, 154.08, 170, 381, '11.7'),
  row(200, 38, 202.74, 221, 298, '7.6'),
  row(200, 50, 202.74, 221, 324, '9.6'),
  row(200, 100, 202.74, 221, 432, '16.9'),
  row(250, 25, 254.46, 275, 324, '6.5'),
  row(250, 50, 254.46, 275, 381, '12.9'),
  row(250, 75, 254.46, 275, 432, '17.9'),
  row(300, 25, 303.18, 326, 381, '8.8'),
  row(300, 38, 303.18, 326, 406, '12.5'),
  row(300, 75, 303.18, 326, 483, '22.1'),
  row(300, 100, 303.18, 326, 533, '27.7'),
]
