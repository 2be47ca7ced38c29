/** Physical constants only. Source: CODATA 2018 (c exact; μ0 = 4π·10⁻⁷ to 10 digits). */
export const SPEED_OF_LIGHT = 299_792_458;
export const MU0 = 4e-7 * Math.PI;
export const EPSILON0 = 1 / (MU0 * SPEED_OF_LIGHT * SPEED_OF_LIGHT);
/** Resistivity of annealed copper at 20 °C, Ω·m. Source: IEC 60028 (58 MS/m). */
export const COPPER_RESISTIVITY = 1.7241e-8;
/** Temperature coefficient of the resistance of copper at 20 °C, per kelvin. Source: IEC 60028. */
export const COPPER_TEMPERATURE_COEFFICIENT = 0.00393;
/** Decibels per neper, 20/ln 10. */
export const DB_PER_NEPER = 20 / Math.LN10;
