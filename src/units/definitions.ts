/**
 * Exact definitions of the customary units, in SI. All are exact; nothing here is rounded.
 *
 * Inch, foot, mile, pound: the international yard (0.9144 m) and pound (0.453 592 37 kg) of 1959; NIST SP 811 (2008),
 * appendix B.6. Btu: the International Table Btu of 1956, i.e. the heat that warms one pound by one degree Fahrenheit
 * at 4186.8 J/(kg·K), which is 1055.055 852 62 J; ISO 80000-5:2007, annex C. Not the thermochemical Btu of 1054.35 J.
 */
export const INCH_M = 0.0254
export const FOOT_M = 0.3048
export const MILE_PER_HOUR_M_PER_S = 1609.344 / 3600
export const POUND_KG = 0.45359237
export const BTU_J = 1055.05585262
/** Pound-force: one pound at standard gravity, 9.80665 m/s². */
export const POUND_FORCE_PER_INCH2_PA = (POUND_KG * 9.80665) / INCH_M ** 2
