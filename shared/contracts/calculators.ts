import { calculators } from '../calculators/registry.ts';
import { calculatorEndpoint } from './calculator-endpoint.ts';

/** The calculators of `shared/calculators` over HTTP. */
export const calculatorEndpoints = calculators.map((calculator) => ({ calculator, endpoint: calculatorEndpoint(calculator) }));
