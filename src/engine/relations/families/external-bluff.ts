import type { RelationFamily } from '../types';

export const externalBluff: RelationFamily = {
  id: 'external-bluff',
  title: 'Bodies of other shapes, flow across',
  geometry: 'bluff body',
  relations: [
    {
      id: 'jakob-1949-square-face',
      title: 'Square bar, face to the gas flow',
      authors: 'Jakob',
      year: '1949',
      inputs: [
        { symbol: 'Re', quantity: 'Reynolds number', unit: '1' },
        { symbol: 'Pr', quantity: 'Prandtl number', unit: '1' },
      ],
      formula: ['Nu = 0.102*Re^0.675*Pr^(1/3)'],
      output: { symbol: 'Nu', quantity: 'Nusselt number', unit: '1' },
      validity: ['5e3 <= Re <= 1e5', 'Pr >= 0.7'],
      validitySymbols: [],
      propertyTemperature: 'film',
      characteristicLength: 'side D',
      wallCondition: 'any',
      accuracy: '',
      source:
        'Incropera, DeWitt, Bergman & Lavine, Fundamentals of Heat and Mass Transfer, 6th/7th ed. (Wiley) Table 7.3; Jakob 1949',
      confirmed: false,
    },
    {
      id: 'jakob-1949-square-corner',
      title: 'Square bar, corner to the gas flow',
      authors: 'Jakob',
      year: '1949',
      inputs: [
        { symbol: 'Re', quantity: 'Reynolds number', unit: '1' },
        { symbol: 'Pr', quantity: 'Prandtl number', unit: '1' },
      ],
      formula: ['Nu = 0.246*Re^0.588*Pr^(1/3)'],
      output: { symbol: 'Nu', quantity: 'Nusselt number', unit: '1' },
      validity: ['5e3 <= Re <= 1e5', 'Pr >= 0.7'],
      validitySymbols: [],
      propertyTemperature: 'film',
      characteristicLength: 'diagonal D',
      wallCondition: 'any',
      accuracy: '',
      source:
        'Incropera, DeWitt, Bergman & Lavine, Fundamentals of Heat and Mass Transfer, 6th/7th ed. (Wiley) Table 7.3; Jakob 1949',
      confirmed: false,
    },
    {
      id: 'jakob-1949-hexagon-face',
      title: 'Hexagonal bar, flat to the gas flow',
      authors: 'Jakob',
      year: '1949',
      inputs: [
        { symbol: 'Re', quantity: 'Reynolds number', unit: '1' },
        { symbol: 'Pr', quantity: 'Prandtl number', unit: '1' },
      ],
      formula: ['Nu = 0.153*Re^0.638*Pr^(1/3)'],
      output: { symbol: 'Nu', quantity: 'Nusselt number', unit: '1' },
      validity: ['5e3 <= Re <= 1e5', 'Pr >= 0.7'],
      validitySymbols: [],
      propertyTemperature: 'film',
      characteristicLength: 'height D across the flow',
      wallCondition: 'any',
      accuracy: '',
      source:
        'Incropera, DeWitt, Bergman & Lavine, Fundamentals of Heat and Mass Transfer, 6th/7th ed. (Wiley) Table 7.3; Jakob 1949',
      confirmed: false,
    },
  ],
};
