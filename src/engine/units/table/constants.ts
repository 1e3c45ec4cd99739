/** Defining factors of the inch-pound system and of heat, exact. NIST SP 811 (2008), appendix B. */
export const inch = 0.0254;
export const foot = 12 * inch;
export const mile = 5280 * foot;
export const pound = 0.45359237;
/** Standard acceleration of free fall, m/s². */
export const gravity = 9.80665;
export const poundForce = pound * gravity;
/** US liquid gallon, 231 cubic inches. */
export const gallon = 231 * inch ** 3;
export const imperialGallon = 4.54609e-3;
/** The interval of one degree Fahrenheit, in K. */
export const degreeFahrenheit = 5 / 9;
/** International table calorie and thermochemical calorie, J. */
export const calorieTable = 4.1868;
export const calorieThermochemical = 4.184;
/** Heats one pound of water by one degree Fahrenheit: calorie × pound × °F / (gram × K). */
export const btuTable = (calorieTable * 1000 * pound * 5) / 9;
export const btuThermochemical = (calorieThermochemical * 1000 * pound * 5) / 9;
export const hour = 3600;
export const day = 86400;
/** Conventional densities behind columns of liquid, kg/m³: water 1000, mercury 13 595.1. */
export const water = 1000;
export const mercury = 13595.1;
