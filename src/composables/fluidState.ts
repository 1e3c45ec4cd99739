import { defaultSettings, evaluateCalculation, propertyDefinitions, type PropertyId } from '#engine';

export interface StateProperty {
  property: string;
  quantity: string;
  symbolLatex: string;
  text: string;
  unit: string;
  uncertainty: string;
}
export interface StateOutcome {
  row?: {
    phase: string;
    formulation: string;
    values: StateProperty[];
    missing: { property: string; reason: string }[];
  };
  problems: string[];
}

const quantityOf = (property: string): string => propertyDefinitions[property as PropertyId]?.quantity ?? property;

/** One state of a substance, its inputs written as on a sheet (`80 degC`, `3 bar`), worked out as a cell would. */
export function fluidState(substance: string, inputs: Readonly<Record<string, string>>): StateOutcome {
  const source = Object.entries(inputs)
    .map(([name, text]) => `${name} = ${text.replace(/\s*\n\s*/g, ' ')}`)
    .join('\n');
  const result = evaluateCalculation({
    settings: { ...defaultSettings, significantDigits: 6 },
    cells: [{ id: 'state', kind: 'fluid', source, settings: { name: 'w', substance, mode: 'state' } }],
  }).cells.state;
  const problems = [...new Set((result?.diagnostics ?? []).map(({ message }) => message))];
  const row = result?.fluid?.rows[0];
  if (row === undefined) return { problems };
  return {
    problems,
    row: {
      phase: row.phase,
      formulation: row.formulation,
      values: row.values.map(({ property, symbolLatex, value, uncertainty }) => ({
        property,
        quantity: quantityOf(property),
        symbolLatex,
        text: value.text,
        unit: value.unit,
        uncertainty,
      })),
      missing: row.missing,
    },
  };
}
