import { z } from 'zod';
import { ERROR_STATUS, type ErrorCode } from '../errors';

const codes = Object.keys(ERROR_STATUS) as [ErrorCode, ...ErrorCode[]];

/** A problem document (RFC 9457) with every problem and its path. */
export const problemSchema = z.object({
  type: z.string(),
  title: z.string(),
  status: z.number().int(),
  detail: z.string().optional(),
  code: z.enum(codes),
  requestId: z.string().optional(),
  problems: z.array(z.object({ path: z.string(), message: z.string() })).optional(),
});
export type ProblemDocument = z.infer<typeof problemSchema>;
