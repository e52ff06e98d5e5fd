import { mkdtempSync, readdirSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { readStartTime } from '@/server/local/find-instance';
import { isFolderLocked, lockFolder } from '@/server/local/lock-folder';

let folder: string;
beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'elbowroom-lock-'));
});
afterEach(() => rmSync(folder, { recursive: true }));

test('a folder is held by one process until it is released', () => {
  const lock = lockFolder(folder);
  expect(isFolderLocked(folder)).toBe(true);
  expect(() => lockFolder(folder)).toThrow(`process ${process.pid}`);
  lock.release();
  expect(isFolderLocked(folder)).toBe(false);
  expect(readdirSync(folder)).toEqual([]);
});

test.each([
  ['a process that is gone', '4194304999 1'],
  ['another process with the same number', `${process.pid} 1`],
  ['nobody, because the disk was full', ''],
])('a lock of %s is taken over', (_case, holder) => {
  writeFileSync(join(folder, 'lock'), holder);
  expect(isFolderLocked(folder)).toBe(false);
  const lock = lockFolder(folder);
  expect(isFolderLocked(folder)).toBe(true);
  lock.release();
});

test('a process knows when it started, and one that is gone has no start', () => {
  expect(readStartTime(process.pid)).toMatch(/^\d+$/);
  expect(readStartTime(4194304999)).toBeUndefined();
});
