import { Router, type RequestHandler } from 'express';
import type * as z from 'zod';
import { route } from '#server/http/route.ts';
import { Refusal, refusalFromZod } from '#server/refusal.ts';
import * as contract from '#shared/contracts/calculators.ts';
import { calculate } from './calculators.service.ts';

interface Calculator {
  name: string;
  input: z.ZodObject;
  endpoint: typeof contract.arrheniusCalculator.endpoint;
}

/** Mounts a calculator: one object in, one result out; or up to a thousand under `items`, each a result or its own error. */
function mount(router: Router, { name, input, endpoint }: Calculator): void {
  route(router, endpoint, async ({ body }) => {
    if ('items' in body && Array.isArray(body.items)) {
      const items = await Promise.all(body.items.map(async (item) => {
        const parsed = input.safeParse(item);
        if (!parsed.success) {
          const [issue] = parsed.error.issues;
          return { error: { path: issue?.path.join('.') ?? '', message: issue?.message ?? 'Not an object.' } };
        }
        try {
          return await calculate(name, parsed.data);
        } catch (error) {
          if (error instanceof Refusal) return { error: error.details.errors?.[0] ?? { path: '', message: error.message } };
          throw error;
        }
      }));
      return { items } as never;
    }
    const parsed = input.safeParse(body);
    if (!parsed.success) throw refusalFromZod(parsed.error);
    return await calculate(name, parsed.data) as never;
  });
}

export function calculatorsRoutes(calculatorLimit: RequestHandler): Router {
  const router = Router();
  router.use('/calc', calculatorLimit);
  for (const calculator of Object.values(contract)) mount(router, calculator as unknown as Calculator);
  return router;
}
