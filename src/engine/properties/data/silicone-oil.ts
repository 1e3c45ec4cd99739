// Coefficients of the source named below, read from the liquid data of CoolProp (MIT licence).
import { exponentialPolynomial, polynomial, vogel } from '../liquids/forms';
import type { Liquid } from '../liquids/types';

/** Heat-transfer oil of dimethyl siloxanes. */
export const siliconeOil: Liquid = {
  id: 'oil_silicone_800',
  name: 'Heat-transfer oil, dimethyl siloxane',
  word: 'dimethyl siloxane oil',
  aliases: ['silicone oil', 'siloxane'],
  formulation: "fit to a maker's data (2017)",
  sources: ['Polynomials fitted to data of a maker of dimethyl siloxane oil (2017)'],
  range: '−40 to 398 °C',
  temperature: [233.15, 671.15],
  rho: polynomial({
    T: 452.15,
    coefficients: [[793.8948601311903], [-0.9273680324374726], [-0.0004763441474735508], [-1.6740390125088996e-6]],
  }),
  cp: polynomial({
    T: 452.15,
    coefficients: [[1880.1830466830477], [1.7078527551971712], [-5.711125775631487e-6], [-4.146361457790793e-8]],
  }),
  mu: exponentialPolynomial({
    T: 452.15,
    coefficients: [[-6.701380616058272], [-0.009157252005384878], [1.9253591888665142e-5], [-5.6587908108650406e-8]],
  }),
  k: polynomial({
    T: 452.15,
    coefficients: [
      [0.10510148969862274],
      [-0.00018801403206687977],
      [1.8941027227019867e-10],
      [-3.884096900022244e-12],
    ],
  }),
  vapourPressure: { from: 307.15, value: vogel(-2322.9519523099234, -146.9809186369734, -18.565281035789198) },
  uncertainty: { rho: '0.1 %', cp: '0.4 %', mu: '1 %', k: '0.4 %', Pr: '2 %' },
};
