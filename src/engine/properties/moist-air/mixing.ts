/** A component of a gas mixture: molar mass and the property pair at the mixture's temperature. */
export interface Component {
  part: number;
  molarMass: number;
  mu: number;
  k: number;
}

/** Wilke's weight of component b in the neighbourhood of a. */
function weight(a: Component, b: Component): number {
  const ratio = Math.sqrt(a.mu / b.mu) * (b.molarMass / a.molarMass) ** 0.25;
  return (1 + ratio) ** 2 / Math.sqrt(8 * (1 + a.molarMass / b.molarMass));
}

/**
 * Viscosity and conductivity of a dilute gas mixture by mole fractions: Wilke, J. Chem. Phys. 18
 * (1950) 517; Wassiljewa's form with the weights of Mason & Saxena, Phys. Fluids 1 (1958) 361.
 */
export function mixDiluteGases(components: readonly Component[]): { mu: number; k: number } {
  let mu = 0;
  let k = 0;
  for (const a of components) {
    let divisor = 0;
    for (const b of components) divisor += b.part * weight(a, b);
    mu += (a.part * a.mu) / divisor;
    k += (a.part * a.k) / divisor;
  }
  return { mu, k };
}
