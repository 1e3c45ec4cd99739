import {
  baseDimension,
  dimensionless,
  divideDimensions,
  multiplyDimensions as times,
  powerOfDimension,
} from '../dimension';
import type { Dimension } from '../types';

const power = (dimension: Dimension, exponent: number): Dimension =>
  powerOfDimension(dimension, exponent) ?? dimensionless;
const per = divideDimensions;

export const one = dimensionless;
export const length = baseDimension('length');
export const mass = baseDimension('mass');
export const time = baseDimension('time');
export const temperature = baseDimension('temperature');
export const amount = baseDimension('amount');
export const current = baseDimension('current');
export const luminosity = baseDimension('luminosity');
export const euro = baseDimension('currency');
export const dollar = baseDimension('US dollar');
export const sterling = baseDimension('pound sterling');
export const franc = baseDimension('Swiss franc');

export const area = power(length, 2);
export const volume = power(length, 3);
export const frequency = power(time, -1);
export const velocity = per(length, time);
export const acceleration = per(velocity, time);
export const volumeFlow = per(volume, time);
export const force = times(mass, acceleration);
export const pressure = per(force, area);
export const energy = times(force, length);
export const heatRate = per(energy, time);
export const heatFlux = per(heatRate, area);
export const energyPerArea = per(energy, area);
export const resistanceOfArea = per(temperature, heatFlux);
export const dynamicViscosity = times(pressure, time);
export const diffusivity = per(area, time);
export const permeance = per(per(mass, time), times(area, pressure));
export const charge = times(current, time);
export const voltage = per(heatRate, current);
export const resistance = per(voltage, current);
export const conductance = per(current, voltage);
export const capacitance = per(charge, voltage);
export const magneticFlux = times(voltage, time);
export const magneticFluxDensity = per(magneticFlux, area);
export const inductance = per(magneticFlux, current);
export const illuminance = per(luminosity, area);
export const catalysis = per(amount, time);
