import { setImmediate } from 'node:timers/promises';
import { Router, type RequestHandler } from 'express';
import * as z from 'zod';
import type { SourcesService } from '#server/features/sources/sources.service.ts';
import { route } from '#server/http/route.ts';
import { Refusal, refusalFromZod } from '#server/refusal.ts';
import { mostItems } from '#shared/contracts/calculator-endpoint.ts';
import { calculatorEndpoints } from '#shared/contracts/calculators.ts';
import * as citations from '#shared/contracts/citations.ts';
import type { Endpoint } from '#shared/contracts/endpoint.ts';
import { calculate, cite } from './calculators.service.ts';

/** The body before it is known whether it is one input or many: faults then name the input, not the union. */
const anyBody = z.unknown();

/** Mounts a calculation: one object in, one result out; or up to a thousand under `items`, each a result or its own error. */
function mount(router: Router, endpoint: Endpoint, run: (input: unknown) => unknown): void {
  route(router, { ...endpoint, body: anyBody }, async ({ body }) => {
    if (typeof body !== 'object' || body === null || !('items' in body) || !Array.isArray(body.items)) return run(body);
    if (body.items.length > mostItems) {
      const message = `At most ${mostItems} items at once, got ${body.items.length}.`;
      throw new Refusal('invalid-input', message, { errors: [{ path: 'items', message }] });
    }
    const items: unknown[] = [];
    for (const item of body.items) {
      try {
        items.push(await run(item));
        // A long batch must not keep everybody else waiting.
        await setImmediate();
      } catch (error) {
        if (!(error instanceof Refusal)) throw error;
        items.push({ error: error.details.errors?.[0] ?? { path: '', message: error.message } });
      }
    }
    return { items };
  });
}

export function calculatorsRoutes(sources: SourcesService, calculatorLimit: RequestHandler): Router {
  const router = Router();
  router.use('/calc', calculatorLimit);
  for (const { calculator, endpoint } of calculatorEndpoints) mount(router, endpoint, (input) => calculate(calculator, input));
  mount(router, citations.cite, async (input) => {
    const parsed = citations.citeInput.safeParse(input);
    if (!parsed.success) throw refusalFromZod(parsed.error);
    return cite(parsed.data, sources);
  });
  return router;
}
