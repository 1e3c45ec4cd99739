/** Greek letters, spelled as they are typed; the letter and the word are the same name. */
export const greekLetters: Readonly<Record<string, string>> = {
  α: 'alpha', β: 'beta', γ: 'gamma', δ: 'delta', ε: 'epsilon', ϵ: 'epsilon', ζ: 'zeta', η: 'eta', θ: 'theta', ϑ: 'theta',
  ι: 'iota', κ: 'kappa', λ: 'lambda', μ: 'mu', ν: 'nu', ξ: 'xi', π: 'pi', ρ: 'rho', σ: 'sigma', ς: 'sigma', τ: 'tau',
  υ: 'upsilon', φ: 'phi', ϕ: 'phi', χ: 'chi', ψ: 'psi', ω: 'omega',
  Γ: 'Gamma', Δ: 'Delta', Θ: 'Theta', Λ: 'Lambda', Ξ: 'Xi', Π: 'Pi', Σ: 'Sigma', Φ: 'Phi', Ψ: 'Psi', Ω: 'Omega',
  '∞': 'inf', '∂': 'partial', '∇': 'nabla',
};

export const greekNames: ReadonlySet<string> = new Set(Object.values(greekLetters));

const subscriptFigures = '₀₁₂₃₄₅₆₇₈₉';

/**
 * The one spelling of a name: Greek letters spelled out, figures set low written after an
 * underscore. `ρ_w` is `rho_w`, `T₁` is `T_1`, `ΔT` is `Delta_T`.
 */
export function canonicalName(name: string): string {
  let canonical = '';
  let behindGreek = false;
  for (const sign of name) {
    const spelled = greekLetters[sign];
    const figure = subscriptFigures.indexOf(sign);
    if (spelled !== undefined) {
      canonical += (canonical === '' || canonical.endsWith('_') ? '' : '_') + spelled;
    } else if (figure >= 0) {
      canonical += /_\d*$/.test(canonical) ? String(figure) : `_${figure}`;
    } else {
      canonical += (behindGreek && /[A-Za-z\d]/.test(sign) ? '_' : '') + sign;
    }
    behindGreek = spelled !== undefined;
  }
  return canonical;
}
