import { z } from 'zod';

/** Every refusal by an endpoint: a permanent code, a sentence to act on and, where there is one, the field. */
export const problemSchema = z.object({
  code: z.string(),
  message: z.string(),
  fields: z.array(z.object({ path: z.string(), message: z.string() })).optional(),
});
export type ProblemDto = z.infer<typeof problemSchema>;
