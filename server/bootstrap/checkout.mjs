/** Where this checkout is, and the paths inside it that several programs need. */
import { dirname, join, resolve } from 'node:path';
import { fileURLToPath } from 'node:url';

/** The top folder of the checkout. */
export const checkout = resolve(dirname(fileURLToPath(import.meta.url)), '..', '..');

/**
 * A path inside the checkout.
 * @param {...string} parts
 */
export const inCheckout = (...parts) => join(checkout, ...parts);
