import { findSubstance, type Outcome, type PropertyId, type State, type Substance } from '#engine';
import { readCsv } from './csv';
import {
  missingInputs,
  propertyNames,
  propertyRow,
  saturatedAir,
  saturationProperties,
  stateInputsOf,
  type PropertyRow,
} from './property-row';
import { agrees, Skips, type Summary } from './summary';

/** A value, why there is none, or that the product does not carry what is asked. */
type Got = { value: number } | { failure: string } | { skip: string };

const notCarried = (state: State, property: PropertyId): boolean =>
  state.missing[property]?.code === 'PROPERTY_NOT_AVAILABLE';

function fromState(outcome: Outcome<State>, property: PropertyId, substance: Substance): Got {
  if (!outcome.ok) return { failure: outcome.error.message };
  const value = outcome.value.values[property];
  if (value !== undefined) return { value };
  return notCarried(outcome.value, property)
    ? { skip: `${property} of ${substance.id} is not carried` }
    : { failure: outcome.value.missing[property]?.message ?? 'no value' };
}

function fromSaturation(row: PropertyRow, substance: Substance): Got {
  const { T, p } = stateInputsOf(row, substance);
  const pair = substance.saturation?.(T === undefined ? { p: p ?? NaN } : { T });
  if (pair === undefined) return { skip: `${row.property} of ${substance.id} is not carried` };
  if (!pair.ok) return { failure: pair.error.message };
  const { h_fg, sigma } = pair.value;
  const values: Record<string, number | undefined> = { p_sat: pair.value.p, T_sat: pair.value.T, h_fg, sigma };
  const value = values[row.property];
  return value === undefined ? { skip: `${row.property} of ${substance.id} is not carried` } : { value };
}

/** The transport equations by themselves, as their papers' tables give them. */
function fromTransport(row: PropertyRow, substance: Substance): Got | undefined {
  const { T, rho } = stateInputsOf(row, substance);
  const { property } = row;
  if (T === undefined || rho === undefined || (property !== 'mu' && property !== 'k')) return undefined;
  // Water's tables name their variant: without the enhancement, the equations alone are meant.
  if (substance.id === 'water' && row.inputs.critical_enhancement !== false) return undefined;
  const value = substance.transport?.(T, rho)[property];
  return value === undefined || Number.isNaN(value) ? undefined : { value };
}

/** Enthalpy between two temperatures, at one pressure. */
function enthalpyRise(row: PropertyRow, substance: Substance): Got {
  const { T1, T2 } = row.inputs;
  if (typeof T1 !== 'number' || typeof T2 !== 'number') return { skip: 'delta_h without T1 and T2' };
  const inputs = stateInputsOf(row, substance);
  const first = fromState(substance.state({ ...inputs, T: T1 }), 'h', substance);
  const second = fromState(substance.state({ ...inputs, T: T2 }), 'h', substance);
  if (!('value' in first)) return first;
  return 'value' in second ? { value: second.value - first.value } : second;
}

/** Saturated moist air; the saturation pressure alone needs no humidity, and no pressure. */
function fromSaturatedAir(row: PropertyRow, substance: Substance): Got {
  const inputs = stateInputsOf(row, substance);
  if (row.property === 'p_ws') return fromState(substance.state({ ...inputs, W: 0 }), 'p_ws', substance);
  if (row.property === 'W_sat') return fromState(substance.state({ ...inputs, W: 0 }), 'W_sat', substance);
  return fromState(substance.state({ ...inputs, RH: 1 }), 'h_da', substance);
}

function valueOf(row: PropertyRow, substance: Substance): Got {
  const { property } = row;
  const inputs = stateInputsOf(row, substance);
  if (property === 'delta_h') return enthalpyRise(row, substance);
  if (property === 'T_freeze' && substance.freezing !== undefined) {
    const outcome = substance.freezing(inputs.massFraction);
    return outcome.ok ? { value: outcome.value } : { failure: outcome.error.message };
  }
  if (substance.id === 'moist_air' && saturatedAir.includes(property)) return fromSaturatedAir(row, substance);
  if (saturationProperties.includes(property) && inputs.x === undefined) return fromSaturation(row, substance);
  const alone = fromTransport(row, substance);
  if (alone !== undefined) return alone;
  if (property === 'cp_molar') {
    const { molarMass } = substance;
    const got = fromState(substance.state(inputs), 'cp', substance);
    return 'value' in got && molarMass !== undefined ? { value: got.value * molarMass } : got;
  }
  return fromState(substance.state(inputs), propertyNames[property] ?? (property as PropertyId), substance);
}

/** Tables of check values write solids with a prefix: `solid:silver`, `refractory:Mullite`. */
const substanceOf = (name: string): Substance | undefined => findSubstance(name.replace(/^(solid|refractory):/, ''));

/** Compares fluid properties with a CSV of check values: substance, property, T_K, p_Pa, inputs (JSON), expected, rel_tol, id. */
export function compareProperties(text: string): Summary {
  const summary: Summary = { passed: 0, failed: 0, skipped: 0, lines: [] };
  const skips = new Skips();
  for (const [index, record] of readCsv(text).entries()) {
    const row = propertyRow.parse(record);
    const substance = substanceOf(row.substance);
    if (substance === undefined) {
      skips.add(`${row.substance} is not carried`);
      continue;
    }
    const reason = missingInputs(row, substance);
    const got: Got = reason === undefined ? valueOf(row, substance) : { skip: reason };
    if ('skip' in got) skips.add(got.skip);
    else if ('value' in got && agrees(got.value, row.expected, row.rel_tol)) summary.passed += 1;
    else {
      summary.failed += 1;
      const shown = 'value' in got ? got.value : got.failure;
      summary.lines.push(
        `row ${index + 2} ${row.id} ${row.substance} ${row.property}: got ${shown}, expected ${row.expected} within ${row.rel_tol}`,
      );
    }
  }
  return { ...summary, skipped: skips.total, lines: [...summary.lines, ...skips.lines()] };
}
