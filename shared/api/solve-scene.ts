import { z } from 'zod';

const complexSchema = z.strictObject({ re: z.number(), im: z.number() });
const pointSchema = z.tuple([z.number(), z.number(), z.number()]);
const positive = z.number().positive();

const wireSchema = z.strictObject({
  id: z.string().min(1).max(200),
  start: pointSchema,
  end: pointSchema,
  radius: positive,
  feed: z.enum(['centre', 'start', 'none']),
  load: complexSchema.optional(),
});

const patternSchema = z.strictObject({
  elevationDeg: z.number().min(-90).max(90),
  stepDeg: z.number().min(0.01).max(360),
});

/** The form of one scene of the headless solver; what can be solved is told by the solver's own checks. */
export const solveSceneSchema = z.strictObject({
  ground: z.enum(['none', 'plane']),
  frequencies: z.array(positive).min(1).max(10_000),
  wires: z.array(wireSchema).min(1).max(1_000),
  pattern: patternSchema.optional(),
});
export type SolveScene = z.infer<typeof solveSceneSchema>;
