import { z } from 'zod';
import type { TaskHandler } from './task-handler';

const mailPayload = z.strictObject({
  to: z.string(),
  subject: z.string(),
  text: z.string(),
});

/** Sends one message; kept and tried for about two days. */
export const mailHandler: TaskHandler<z.infer<typeof mailPayload>> = {
  payload: mailPayload,
  attempts: 60,
  secret: true,
  run: async (mail, { services, taskId }) => {
    await services.mailer.send({ ...mail, messageId: taskId });
    return null;
  },
};
