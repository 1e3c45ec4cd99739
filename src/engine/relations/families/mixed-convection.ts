import type { RelationFamily } from '../types';

export const mixedConvection: RelationFamily = {
  id: 'mixed-convection',
  title: 'Mixed convection',
  geometry: 'any',
  relations: [
    {
      id: 'churchill-1977-mixed',
      title: 'Combination of forced and natural convection',
      authors: 'Churchill',
      year: '1977',
      inputs: [
        { symbol: 'Nu_F', quantity: 'forced-convection Nusselt number', unit: '1' },
        { symbol: 'Nu_N', quantity: 'natural-convection Nusselt number', unit: '1' },
        { symbol: 'sg', quantity: '+1 assisting or transverse, -1 opposing', unit: '1' },
        {
          symbol: 'n',
          quantity: '3 vertical plate, 3.5 horizontal plate (transverse), 4 cylinder or sphere',
          unit: '1',
        },
      ],
      formula: ['Nu = abs(Nu_F^n + sg*Nu_N^n)^(1/n)'],
      output: { symbol: 'Nu', quantity: 'Nusselt number', unit: '1' },
      validity: ['Nu_F > 0'],
      validitySymbols: [],
      propertyTemperature: 'as the two parts',
      characteristicLength: 'as the two parts',
      wallCondition: 'any',
      accuracy: '',
      source:
        'Churchill, AIChE J. 23 (1977) 10; Incropera, DeWitt, Bergman & Lavine, Fundamentals of Heat and Mass Transfer, 6th/7th ed. (Wiley) eq. 9.64',
      confirmed: false,
    },
    {
      id: 'richardson-number',
      title: 'Richardson number (importance of buoyancy)',
      authors: 'definition',
      year: '',
      inputs: [
        { symbol: 'Gr', quantity: 'Grashof number', unit: '1' },
        { symbol: 'Re', quantity: 'Reynolds number', unit: '1' },
      ],
      formula: ['Ri = Gr/Re^2'],
      output: { symbol: 'Ri', quantity: 'Richardson number', unit: '1' },
      validity: ['Re > 0'],
      validitySymbols: [],
      propertyTemperature: 'film',
      characteristicLength: 'same length in Gr and Re',
      wallCondition: 'any',
      accuracy: '',
      source:
        'Incropera, DeWitt, Bergman & Lavine, Fundamentals of Heat and Mass Transfer, 6th/7th ed. (Wiley) sec. 9.9 (0.1 forced, 10 natural as usual limits)',
      confirmed: false,
    },
  ],
};
