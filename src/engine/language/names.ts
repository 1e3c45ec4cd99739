/** Greek letters, spelled as they are typed; the letter and the word are the same name. */
export const greekLetters: Readonly<Record<string, string>> = {
  α: 'alpha',
  β: 'beta',
  γ: 'gamma',
  δ: 'delta',
  ε: 'epsilon',
  ϵ: 'epsilon',
  ζ: 'zeta',
  η: 'eta',
  θ: 'theta',
  ϑ: 'theta',
  ι: 'iota',
  κ: 'kappa',
  λ: 'lambda',
  μ: 'mu',
  ν: 'nu',
  ξ: 'xi',
  π: 'pi',
  ρ: 'rho',
  ϱ: 'rho',
  σ: 'sigma',
  ς: 'sigma',
  τ: 'tau',
  υ: 'upsilon',
  φ: 'phi',
  ϕ: 'phi',
  χ: 'chi',
  ψ: 'psi',
  ω: 'omega',
  Γ: 'Gamma',
  Δ: 'Delta',
  Θ: 'Theta',
  Λ: 'Lambda',
  Ξ: 'Xi',
  Π: 'Pi',
  Σ: 'Sigma',
  Φ: 'Phi',
  Ψ: 'Psi',
  Ω: 'Omega',
  '∞': 'inf',
  '∂': 'partial',
  '∇': 'nabla',
};

export const greekNames: ReadonlySet<string> = new Set(Object.values(greekLetters));

/** Marks set over a letter, and the word that stands for each: `V̇` is `V_dot`. */
const marks: Readonly<Record<string, string>> = {
  '\u0307': 'dot',
  '\u0304': 'bar',
  '\u0305': 'bar',
  '\u0302': 'hat',
  '\u0303': 'tilde',
};
const loweredFigures = '₀₁₂₃₄₅₆₇₈₉';

/** Letters with two code points (micro sign, increment sign) become one; accents stand apart. */
function decomposed(name: string): string {
  return name
    .normalize('NFD')
    .replace(/\u00b5/g, 'μ')
    .replace(/\u2206/g, 'Δ');
}

/**
 * The one spelling of a name: Greek letters spelled out, figures set low written after an
 * underscore, marks over a letter as words after it. `ρ_w` is `rho_w`, `T₁` is `T_1`, `V̇` is
 * `V_dot`, `ΔT` and `DeltaT` are `Delta_T`; `ρ1` is `rho1`, as it would be typed.
 */
export function canonicalName(name: string): string {
  let canonical = '';
  /** A letter that follows must be set apart, or the two would run into one word. */
  let apart = false;
  const word = (spelled: string) => {
    canonical += canonical === '' || canonical.endsWith('_') ? spelled : `_${spelled}`;
    apart = true;
  };
  for (const sign of decomposed(name)) {
    const spelled = greekLetters[sign] ?? marks[sign];
    const figure = loweredFigures.indexOf(sign);
    if (spelled !== undefined) word(spelled);
    else if (figure >= 0) {
      canonical += /_\d*$/.test(canonical) ? String(figure) : `_${figure}`;
      apart = false;
    } else {
      canonical += (apart && /\p{L}/u.test(sign) ? '_' : '') + sign;
      apart = false;
    }
  }
  return canonical.normalize('NFC').replace(/^Delta(?=\p{L})/u, 'Delta_');
}
