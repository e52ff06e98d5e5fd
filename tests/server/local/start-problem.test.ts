import { explainFileError } from '@/server/local/start-problem';

test.each([
  ['ENOSPC', /disk that holds \/data is full/],
  ['EDQUOT', /disk that holds \/data is full/],
  ['EACCES', /cannot be written by this user/],
  ['EROFS', /cannot be written by this user/],
  ['ENOTDIR', /is not a folder/],
])('%s is explained in one line that says what to do', (code, line) => {
  const message = explainFileError(Object.assign(new Error('raw'), { code }), '/data')?.message ?? '';
  expect(message).toMatch(line);
  expect(message).toContain('ELBOWROOM_DATA');
  expect(message).not.toContain('\n');
});

test('another error is left as it is', () => {
  expect(explainFileError(new Error('of another kind'), '/data')).toBeUndefined();
  expect(explainFileError(null, '/data')).toBeUndefined();
});
