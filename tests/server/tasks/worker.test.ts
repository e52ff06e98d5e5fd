import { transact } from '@/server/database/transaction';
import { Task } from '@/server/models/task';
import { enqueueTask } from '@/server/tasks/enqueue-task';
import { DEFAULT_PACE, TaskWorker } from '@/server/tasks/worker';
import { startTestServer, type TestServer } from '../../support/test-server';

const MAIL = { to: 'a@example.com', subject: 'subject', text: 'text' };
let server: TestServer;
beforeAll(async () => {
  server = await startTestServer();
});
afterEach(async () => {
  server.outbox.length = 0;
  jest.restoreAllMocks();
  await Task.destroy({ where: {} });
});
afterAll(() => server.stop());

function enqueue(): Promise<Task> {
  return transact(server.services.sequelize, (transaction) => enqueueTask('mail', MAIL, { transaction }));
}

async function waitFor(condition: () => Promise<boolean>): Promise<void> {
  while (!(await condition())) await new Promise((resolve) => setImmediate(resolve));
}

test('a task is kept with what caused it, or not at all', async () => {
  const failing = transact(server.services.sequelize, async (transaction) => {
    await enqueueTask('mail', MAIL, { transaction });
    throw new Error('the cause failed');
  });
  await expect(failing).rejects.toThrow('the cause failed');
  expect(await Task.count()).toBe(0);
});

test('a task is done once, and its payload with secrets is cleared', async () => {
  const task = await enqueue();
  await server.performTasks();
  await server.performTasks();
  expect(server.outbox).toHaveLength(1);
  await task.reload();
  expect(task).toMatchObject({ state: 'done', attempts: 1, progress: 1, payload: '{}', problem: null });
});

test('a running worker takes a task as soon as it is committed', async () => {
  const worker = new TaskWorker(server.services, { ...DEFAULT_PACE, pollMs: 3_600_000 });
  worker.start();
  const task = await enqueue();
  await waitFor(async () => (await task.reload()).state === 'done');
  await worker.stop();
  expect(server.outbox).toHaveLength(1);
});

test('workers side by side do each task once', async () => {
  const tasks = await Promise.all(Array.from({ length: 20 }, enqueue));
  const workers = [new TaskWorker(server.services), new TaskWorker(server.services)];
  for (const worker of workers) worker.start();
  await waitFor(async () => (await Task.count({ where: { state: 'done' } })) === tasks.length);
  await Promise.all(workers.map((worker) => worker.stop()));
  const sent = server.outbox.map(({ messageId }) => messageId);
  expect([...sent].sort()).toEqual(tasks.map(({ id }) => id).sort());
});

test('a task that fails waits longer each time, then is done', async () => {
  const send = jest.spyOn(server.services.mailer, 'send').mockRejectedValue(new Error('no server there'));
  const task = await enqueue();
  const waits = [];
  for (let attempt = 1; attempt <= 4; attempt += 1) {
    const before = Date.now();
    await server.performTasks();
    await task.reload();
    expect(task).toMatchObject({ state: 'waiting', attempts: attempt, problem: 'no server there' });
    waits.push(Math.round((task.runAt.getTime() - before) / DEFAULT_PACE.firstRetryMs));
    await task.update({ runAt: new Date(0) });
  }
  expect(waits).toEqual([1, 2, 4, 8]);
  send.mockRestore();
  await server.performTasks();
  expect((await task.reload()).state).toBe('done');
  expect(server.outbox).toHaveLength(1);
});

test('a task that failed too often stays, as failed', async () => {
  jest.spyOn(server.services.mailer, 'send').mockRejectedValue(new Error('never'));
  const task = await enqueue();
  await task.update({ attempts: 59 });
  await server.performTasks();
  expect(await task.reload()).toMatchObject({ state: 'failed', attempts: 60, problem: 'never' });
  expect(JSON.parse(task.payload)).toEqual(MAIL);
});

test('a task whose process was killed is taken again when its lease ends', async () => {
  const task = await enqueue();
  await task.update({
    state: 'running',
    attempts: 1,
    lease: 'gone',
    leaseUntil: new Date(Date.now() + 60_000),
  });
  await server.performTasks();
  expect(server.outbox).toHaveLength(0);
  await task.update({ leaseUntil: new Date(Date.now() - 1) });
  await server.performTasks();
  expect(server.outbox).toHaveLength(1);
  expect(await task.reload()).toMatchObject({ state: 'done', attempts: 2 });
});

test('a task that was cancelled while it ran stays cancelled', async () => {
  const task = await enqueue();
  jest.spyOn(server.services.mailer, 'send').mockImplementation(async () => {
    await Task.update({ state: 'cancelled' }, { where: { id: task.id } });
  });
  await server.performTasks();
  expect((await task.reload()).state).toBe('cancelled');
});

test('stopping gives up what runs without losing it or counting the attempt', async () => {
  const worker = new TaskWorker(server.services, DEFAULT_PACE);
  let begun = false;
  let giveUp: (error: Error) => void = () => undefined;
  jest.spyOn(server.services.mailer, 'send').mockImplementation(() => {
    begun = true;
    return new Promise((_resolve, reject) => (giveUp = reject));
  });
  const task = await enqueue();
  worker.start();
  await waitFor(async () => begun);
  const stopped = worker.stop();
  await waitFor(async () => Promise.resolve(true));
  giveUp(new Error('the connection was closed'));
  await stopped;
  expect(await task.reload()).toMatchObject({ state: 'waiting', attempts: 0 });
});

test('a kind of task that this version does not know fails, and says so', async () => {
  const task = await Task.create({ kind: 'unheard-of', payload: '{}', runAt: new Date(0), attempts: 2 });
  await server.performTasks();
  expect(await task.reload()).toMatchObject({ state: 'failed', attempts: 3 });
  expect(task.problem).toContain('unheard-of');
});
