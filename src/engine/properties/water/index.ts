import type { Substance } from '../types';
export { backgroundConductivity as waterBackgroundConductivity, viscosity as waterViscosity } from './transport';
import { limits, saturation, waterState } from './state';

/** Water and steam by the industrial formulation. */
export const water: Substance = {
  id: 'water',
  name: 'Water',
  aliases: ['steam', 'H2O', 'condensate', 'feed water'],
  sources: [
    'IAPWS R7-97(2012), Industrial Formulation 1997 for the Thermodynamic Properties of Water and Steam',
    'IAPWS R12-08(2008), Viscosity of Ordinary Water Substance (without critical enhancement)',
    'IAPWS R15-11(2011), Thermal Conductivity of Ordinary Water Substance (for industrial use)',
    'IAPWS R1-76(2014), Surface Tension of Ordinary Water Substance',
  ],
  range: '0 to 800 °C up to 1000 bar, to 2000 °C up to 500 bar; viscosity and conductivity to 900 °C',
  limits,
  inputs: [
    ['T', 'p'],
    ['T', 'x'],
    ['p', 'x'],
    ['p', 'h'],
    ['p', 's'],
    ['T', 'rho'],
  ],
  state: waterState,
  saturation,
};
