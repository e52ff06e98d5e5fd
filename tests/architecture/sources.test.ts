import { execFileSync } from 'node:child_process';
import { readFileSync } from 'node:fs';
import path from 'node:path';

const ROOT = path.resolve(__dirname, '../..');
const files = execFileSync('git', ['ls-files', '--cached', '--others', '--exclude-standard'], { cwd: ROOT })
  .toString()
  .split('\n')
  .filter((file) => /\.(ts|tsx|mjs)$/.test(file));
const TOP = ['app', 'components', 'server', 'shared', 'tests'];

test('there are sources to look at', () => {
  expect(files.length).toBeGreaterThan(50);
});

test.each(TOP)('%s: file names are kebab-case', (top) => {
  const odd = files
    .filter((file) => file.startsWith(`${top}/`) && top !== 'app')
    .filter(
      (file) =>
        !/^[a-z0-9]+(-[a-z0-9]+)*(\.(test|bench|d|web|worker))*\.(ts|tsx|mjs)$/.test(path.basename(file)),
    )
    .filter((file) => !/^server\/database\/migrations\/\d{4}-[a-z0-9-]+\.ts$/.test(file));
  expect(odd).toEqual([]);
});

test('no file is longer than 400 lines', () => {
  const long = files
    .map((file) => ({ file, lines: readFileSync(path.join(ROOT, file), 'utf8').split('\n').length - 1 }))
    .filter(({ lines }) => lines > 400);
  expect(long).toEqual([]);
});

test('a route is its parameters and one screen: at most 30 lines', () => {
  const long = files
    .filter((file) => file.startsWith('app/') && !path.basename(file).startsWith('_'))
    .filter((file) => readFileSync(path.join(ROOT, file), 'utf8').split('\n').length > 31);
  expect(long).toEqual([]);
});

test('only Expo Router, the tools and jest get default exports', () => {
  const odd = files
    .filter((file) => /^(components|server|shared)\//.test(file))
    .filter((file) => /^export default /m.test(readFileSync(path.join(ROOT, file), 'utf8')));
  expect(odd).toEqual([]);
});

test('no test is skipped or exclusive', () => {
  const odd = files
    .filter((file) => file.startsWith('tests/') && !file.startsWith('tests/architecture/'))
    .filter((file) =>
      /\b(test|it|describe)\.(skip|only)\b|\b(xit|xtest|xdescribe|fit|fdescribe)\(/.test(
        readFileSync(path.join(ROOT, file), 'utf8'),
      ),
    );
  expect(odd).toEqual([]);
});
