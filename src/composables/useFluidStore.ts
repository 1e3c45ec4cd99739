import { computed, reactive, ref, watch } from 'vue';
import { findSubstance, listSubstances, type Substance } from '#engine';
import { fluidState } from './fluidState';

type Input = Substance['inputs'][number][number];

export const inputWords: Readonly<Partial<Record<string, string>>> = {
  T: 'Temperature',
  p: 'Pressure, absolute',
  x: 'Vapour quality',
  h: 'Specific enthalpy',
  s: 'Specific entropy',
  rho: 'Density',
  massFraction: 'Mass fraction',
  RH: 'Relative humidity',
  W: 'Humidity ratio',
  T_wb: 'Wet-bulb temperature',
  T_dp: 'Dew-point temperature',
};

/** What stands in a field until something else is written. */
const usual: Readonly<Record<string, string>> = {
  p: '1 atm',
  x: '0.5',
  massFraction: '0.1',
  RH: '0.5',
  W: '0.01',
  T_wb: '20 degC',
  T_dp: '10 degC',
};

const groups: readonly { group: NonNullable<Substance['group']>; title: string }[] = [
  { group: 'fluid', title: 'Fluids' },
  { group: 'liquid', title: 'Liquids and mixtures' },
  { group: 'solid', title: 'Solids' },
];

/** 20 °C, or the nearest round temperature that the substance's range holds. */
function usualTemperature({ limits: { T } }: Substance): string {
  const celsius = Math.min(Math.max(20, Math.ceil(T[0] - 273.15 + 1)), Math.floor(T[1] - 273.15 - 1));
  return `${celsius} degC`;
}

/** Substances that carry every word in name, id or another word for them, under their headings. */
export function findSubstances(sought: string): { title: string; substances: Substance[] }[] {
  const words = sought.toLowerCase().split(/\s+/).filter(Boolean);
  const found = listSubstances().filter(({ id, name, aliases }) => {
    const text = [id, name, ...aliases].join(' ').toLowerCase();
    return words.every((word) => text.includes(word));
  });
  return groups
    .map(({ group, title }) => ({ title, substances: found.filter((one) => (one.group ?? 'fluid') === group) }))
    .filter(({ substances }) => substances.length > 0);
}

/** The store of fluids: one substance, the way its state is given, and the state that follows. */
export function useFluidStore(chosen: () => string) {
  const sought = ref('');
  const found = computed(() => findSubstances(sought.value));
  const substance = computed(() => findSubstance(chosen()) ?? listSubstances()[0]);

  const ways = computed(() =>
    (substance.value?.inputs ?? []).map((inputs) => ({ value: inputs.join(' '), label: inputs.join(', ') })),
  );
  const way = ref('');
  const written = reactive<Record<string, string>>({});
  watch(
    substance,
    (now) => {
      way.value = now?.inputs[0]?.join(' ') ?? '';
      if (now !== undefined) Object.assign(written, usual, { T: usualTemperature(now) });
    },
    { immediate: true },
  );

  const inputs = computed(() => way.value.split(' ').filter((name): name is Input => name !== ''));
  const outcome = computed(() =>
    fluidState(
      substance.value?.id ?? '',
      Object.fromEntries(
        inputs.value.flatMap((name) => {
          const text = (written[name] ?? '').trim();
          return text === '' ? [] : [[name, text]];
        }),
      ),
    ),
  );
  return { sought, found, substance, ways, way, inputs, written, outcome };
}
