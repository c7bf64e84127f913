import { z } from 'zod';
import { defineEndpoint } from './endpoint.ts';

export const getHealth = defineEndpoint({
  method: 'get',
  path: '/api/health',
  summary: 'Whether the server is up, and how long the reading queue is',
  action: null,
  reply: z.object({
    status: z.literal('ok'),
    version: z.string(),
    queue: z.object({ waiting: z.number().int(), active: z.number().int() }),
  }),
});
