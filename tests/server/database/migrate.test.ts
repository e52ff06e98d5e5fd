import { gunzipSync } from 'node:zlib';
import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { connect } from '@/server/database/connection';
import { dumpDatabase, targetOfUrl } from '@/server/database/dump';
import { migrate } from '@/server/database/migrate';
import { createPrivateDatabase } from '@/server/local/private-accounts';
import { administer } from '@/server/local/private-database';

const NAME = 'elbowroom_test_migrate';
const FIRST = '0001-people-and-teams';
const socket = process.env['TEST_DATABASE_SOCKET'] ?? '';
const ownerUrl = `${process.env['TEST_DATABASE_OWNER_URL']}/${NAME}`;

beforeEach(() => createPrivateDatabase(socket, NAME));
afterEach(() => administer(socket, `DROP DATABASE \`${NAME}\``));

test('an empty database is migrated without a dump, one with rows after a dump of what was there', async () => {
  const folder = mkdtempSync(join(tmpdir(), 'elbowroom-dump-'));
  const owner = connect(ownerUrl, 3);
  const dumped: string[] = [];
  const beforeChange = async (pending: readonly string[]) => {
    const path = join(folder, `${dumped.length}.sql.gz`);
    await dumpDatabase(targetOfUrl(ownerUrl), path);
    dumped.push(path);
    expect(pending).not.toContain(FIRST);
  };
  try {
    expect(await migrate(owner, { upTo: FIRST, beforeChange })).toEqual([FIRST]);
    expect(dumped).toEqual([]);
    await administer(
      socket,
      `INSERT INTO \`${NAME}\`.teams VALUES ('x', 'Kept in the dump', 0, NOW(), NOW())`,
    );
    expect((await migrate(owner, { beforeChange })).length).toBeGreaterThan(0);
    expect(dumped).toHaveLength(1);
    const dump = gunzipSync(readFileSync(dumped[0] ?? '')).toString();
    expect(dump).toContain('Kept in the dump');
    expect(dump).not.toContain('CREATE TABLE `revisions`');
  } finally {
    await owner.close();
    rmSync(folder, { recursive: true });
  }
});

test('nothing is migrated when the dump before it fails', async () => {
  const owner = connect(ownerUrl, 3);
  try {
    await migrate(owner, { upTo: FIRST });
    const beforeChange = () => Promise.reject(new Error('the disk is full'));
    await expect(migrate(owner, { beforeChange })).rejects.toThrow('the disk is full');
    expect((await migrate(owner, { beforeChange: () => Promise.resolve() })).length).toBeGreaterThan(0);
  } finally {
    await owner.close();
  }
});
