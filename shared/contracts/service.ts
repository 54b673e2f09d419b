import * as z from 'zod';
import { endpoint } from './endpoint.ts';

export const getHealth = endpoint({
  method: 'GET', path: '/health', access: 'visitor', summary: 'Whether the service and its database answer',
  response: z.object({ status: z.enum(['ok', 'degraded']), database: z.enum(['ok', 'unavailable']), version: z.string() }),
});
export const getReady = endpoint({
  method: 'GET', path: '/ready', access: 'visitor', summary: 'Whether requests may be sent here', response: z.object({ ready: z.boolean() }),
});
