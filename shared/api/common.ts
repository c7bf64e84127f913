import { z } from 'zod';

export const id = z.string().min(1).max(64);
export const time = z.iso.datetime();
export const ok = z.object({ ok: z.literal(true) });

export const manualParams = z.object({ manualId: id });
export const pageParams = z.object({ pageId: id });

/** Every list takes these two. */
export const listQuery = z.object({
  limit: z.coerce.number().int().min(1).max(1000).default(500),
  cursor: z.string().max(200).optional(),
});
export type ListQuery = z.infer<typeof listQuery>;

export const listOf = <T extends z.ZodType>(item: T) =>
  z.object({ items: z.array(item), nextCursor: z.string().nullable() });

/** RFC 9457 problem details, with the faults of a refused body. */
export const problem = z
  .object({
    type: z.string(),
    title: z.string(),
    status: z.number().int(),
    detail: z.string(),
    code: z.string(),
    requestId: z.string(),
    issues: z.array(z.object({ path: z.string(), message: z.string() })).optional(),
  })
  .loose();
export type Problem = z.infer<typeof problem>;
