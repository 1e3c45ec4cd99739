/** A kind of quantity: its name in sentences, coherent SI unit, and the units it is shown in. */
export interface Quantity {
  name: string;
  si: string;
  /** Unit and the magnitude in SI from which on it is used, rising; the first holds from zero. */
  SI: readonly (readonly [unit: string, from: number])[];
  US: readonly (readonly [unit: string, from: number])[];
}

const row = (name: string, si: string, SI: string, US: string): Quantity => ({
  name,
  si,
  SI: choices(SI),
  US: choices(US),
});

/** `mm, m:0.1` is millimetres, and metres from 0.1 (SI) on. */
function choices(text: string): [string, number][] {
  return text.split(', ').map((part) => {
    const [unit = '', from = '0'] = part.split(':');
    return [unit, Number(from)];
  });
}

const currencies = ['EUR', 'USD', 'GBP', 'CHF'];

/** In which units results are shown when the line asks for none. Common practice, no source. */
export const quantities: readonly Quantity[] = [
  row('length', 'm', 'mm, m:1', 'in, ft:0.3048'),
  row('area', 'm^2', 'mm^2, cm^2:1e-4, m^2:0.1', 'in^2, ft^2:0.0929'),
  row('volume', 'm^3', 'mm^3, cm^3:1e-6, L:1e-3, m^3:1', 'in^3, gal:3.785e-3, ft^3:1'),
  row('mass', 'kg', 'g, kg:1, t:1e5', 'lb'),
  row('time', 's', 's, min:600, h:36000', 's, min:600, h:36000'),
  row('temperature', 'K', 'K', 'delta_degF'),
  row('amount of substance', 'mol', 'mol', 'mol'),
  row('electric current', 'A', 'A', 'A'),
  row('luminous intensity', 'cd', 'cd', 'cd'),
  row('frequency or angular velocity', '1/s', '1/s', '1/s'),
  row('velocity', 'm/s', 'm/s', 'ft/s'),
  row('acceleration', 'm/s^2', 'm/s^2', 'ft/s^2'),
  row('volume flow', 'm^3/s', 'L/min, m^3/h:5e-5', 'gal/min'),
  row('mass flow', 'kg/s', 'kg/h, kg/s:0.1', 'lb/h'),
  row('mass flux', 'kg/(m^2*s)', 'kg/(m^2*s)', 'lb/(ft^2*s)'),
  row('density', 'kg/m^3', 'kg/m^3', 'lb/ft^3'),
  row('specific volume', 'm^3/kg', 'm^3/kg', 'ft^3/lb'),
  row('force', 'N', 'N, kN:1e4', 'lbf'),
  row('pressure', 'Pa', 'Pa, kPa:1e3, bar:1e5', 'inH2O, psi:6894'),
  row('pressure gradient', 'Pa/m', 'Pa/m, kPa/m:1e4', 'psi/ft'),
  row('energy', 'J', 'J, kJ:1e3, MJ:1e6, GJ:1e9', 'BTU'),
  row('heat rate', 'W', 'W, kW:1e3, MW:1e6', 'BTU/h'),
  row('heat flux', 'W/m^2', 'W/m^2, kW/m^2:1e4', 'BTU/(h*ft^2)'),
  row('heat rate per length', 'W/m', 'W/m, kW/m:1e4', 'BTU/(h*ft)'),
  row('volumetric heat rate', 'W/m^3', 'W/m^3, kW/m^3:1e4, MW/m^3:1e7', 'BTU/(h*ft^3)'),
  row('heat transfer coefficient', 'W/(m^2*K)', 'W/(m^2*K)', 'BTU/(h*ft^2*delta_degF)'),
  row('thermal conductivity', 'W/(m*K)', 'W/(m*K)', 'BTU/(h*ft*delta_degF)'),
  row('thermal resistance', 'K/W', 'K/W', 'h*delta_degF/BTU'),
  row('thermal resistance of an area', 'm^2*K/W', 'm^2*K/W', 'h*ft^2*delta_degF/BTU'),
  row('thermal resistance of a length', 'm*K/W', 'm*K/W', 'h*ft*delta_degF/BTU'),
  row('conductance or heat capacity rate', 'W/K', 'W/K, kW/K:1e4', 'BTU/(h*delta_degF)'),
  row('heat capacity', 'J/K', 'J/K, kJ/K:1e3', 'BTU/delta_degF'),
  row('specific heat capacity', 'J/(kg*K)', 'J/(kg*K), kJ/(kg*K):1e3', 'BTU/(lb*delta_degF)'),
  row('specific energy', 'J/kg', 'J/kg, kJ/kg:1e3', 'BTU/lb'),
  row('dynamic viscosity', 'Pa*s', 'µPa*s, mPa*s:1e-3, Pa*s:1', 'cP'),
  row('kinematic viscosity or diffusivity', 'm^2/s', 'mm^2/s, m^2/s:1e-3', 'ft^2/h'),
  row('surface tension', 'N/m', 'mN/m, N/m:1', 'lbf/ft'),
  row('thermal expansion coefficient', '1/K', '1/K', '1/delta_degF'),
  row('reciprocal length', '1/m', '1/m', '1/ft'),
  row('reciprocal area', '1/m^2', '1/m^2', '1/ft^2'),
  row('reciprocal volume', '1/m^3', '1/m^3', '1/ft^3'),
  row('temperature gradient', 'K/m', 'K/m', 'delta_degF/ft'),
  row('second moment of area', 'm^4', 'cm^4, m^4:1e-2', 'in^4'),
  row('mass per length', 'kg/m', 'kg/m', 'lb/ft'),
  row('mass per area', 'kg/m^2', 'kg/m^2', 'lb/ft^2'),
  row('temperature rate', 'K/s', 'K/s', 'delta_degF/s'),
  row('volumetric heat capacity', 'J/(m^3*K)', 'kJ/(m^3*K), MJ/(m^3*K):1e6', 'BTU/(ft^3*delta_degF)'),
  row('thermal effusivity', 'W*s^(1/2)/(m^2*K)', 'W*s^(1/2)/(m^2*K)', 'W*s^(1/2)/(m^2*K)'),
  row('voltage', 'V', 'V', 'V'),
  row('electric charge', 'C', 'C', 'C'),
  row('electric resistance', 'ohm', 'ohm', 'ohm'),
  row('molar mass', 'kg/mol', 'g/mol, kg/mol:1', 'g/mol'),
  row('molar energy', 'J/mol', 'J/mol, kJ/mol:1e3', 'J/mol'),
  row('molar heat capacity', 'J/(mol*K)', 'J/(mol*K)', 'J/(mol*K)'),
  row('energy per area', 'J/m^2', 'kJ/m^2, MJ/m^2:1e6', 'BTU/ft^2'),
  row('specific heat rate', 'W/kg', 'W/kg', 'BTU/(h*lb)'),
  row('mole flow', 'mol/s', 'mol/s', 'mol/s'),
  row('amount concentration', 'mol/m^3', 'mol/m^3', 'mol/m^3'),
  row('electric conductivity', 'S/m', 'S/m', 'S/m'),
  row('hydraulic resistance', 'Pa*s/m^3', 'Pa*s/m^3', 'psi*s/ft^3'),
  row('radiation constant', 'W/(m^2*K^4)', 'W/(m^2*K^4)', 'BTU/(h*ft^2*degR^4)'),
  ...currencies.flatMap((unit) => [
    row('money', unit, unit, unit),
    row('price of energy', `${unit}/J`, `${unit}/kWh`, `${unit}/kWh`),
    row('price per time', `${unit}/s`, `${unit}/h`, `${unit}/h`),
    row('price per mass', `${unit}/kg`, `${unit}/kg`, `${unit}/lb`),
    row('price per volume', `${unit}/m^3`, `${unit}/m^3`, `${unit}/gal`),
    row('price of heat rate', `${unit}/W`, `${unit}/kW`, `${unit}/kW`),
  ]),
];
