/** A property at temperatures in K; one temperature alone gives a value taken as constant over the material's range. */
export interface Column {
  T: readonly number[];
  values: readonly number[];
  /** Viscosities: the logarithm is interpolated over 1/T. */
  logarithmic?: true;
}

export type TableProperty = 'rho' | 'cp' | 'mu' | 'k';

/** A material given by tables over temperature, for liquids and solids that have no published equation. */
export interface MaterialTable {
  id: string;
  name: string;
  /** As it stands in a sentence: `engine oil`. */
  word: string;
  aliases: string[];
  phase: 'liquid' | 'solid';
  formulation: string;
  sources: string[];
  range: string;
  temperature: [number, number];
  columns: Partial<Record<TableProperty, Column>>;
  freezing?: number;
  uncertainty: Partial<Record<TableProperty, string>>;
}
