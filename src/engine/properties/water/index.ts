import { inputPairs, pureFluidSaturation, pureFluidState } from '../pure-fluid/index';
import type { Substance } from '../types';
import { waterModel } from './model';
import { backgroundConductivity, viscosity } from './transport';

export { backgroundConductivity as waterBackgroundConductivity, viscosity as waterViscosity } from './transport';

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
  limits: waterModel.limits,
  inputs: inputPairs(waterModel),
  molarMass: 0.018015268,
  state: (inputs) => pureFluidState(waterModel, inputs),
  saturation: (given) => pureFluidSaturation(waterModel, given),
  transport: (T, rho) => ({ mu: viscosity(T, rho), k: backgroundConductivity(T, rho) }),
};
