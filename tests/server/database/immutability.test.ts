import { createHash } from 'node:crypto';
import { QueryTypes, type Sequelize } from 'sequelize';
import { readDatabaseErrno } from '@/server/database/transaction';
import { Revision } from '@/server/models/revision';
import { buildLayout, buildMember, buildRevision, buildTeam } from '../../support/factories';
import { startTestServer, type TestServer } from '../../support/test-server';

/** ER_TABLEACCESS_DENIED_ERROR: the account has no right to it. */
const DENIED = 1142;
/** The number that our triggers refuse with. */
const IMMUTABLE = 31001;
/** ER_ROW_IS_REFERENCED_2: a foreign key restricts it. */
const REFERENCED = 1451;
/** ER_TRUNCATE_ILLEGAL_FK: a table that others refer to. */
const TRUNCATE_REFERENCED = 1701;
/** ER_CONSTRAINT_FAILED: a CHECK does not hold. */
const CHECK_FAILED = 4025;
/** ER_DUP_ENTRY */
const DUPLICATE = 1062;

let server: TestServer;
let ids: { team: string; job: string; platform: string; layout: string; revision: string; member: string };
let before: unknown;
beforeAll(async () => {
  server = await startTestServer();
  const team = await buildTeam();
  const integrator = await buildMember(['integrator'], { team });
  const { job, platform, layout } = await buildLayout(team);
  const revision = await buildRevision(server, layout, integrator, ['submitted', 'frozen']);
  ids = {
    team: team.id,
    job: job.id,
    platform: platform.id,
    layout: layout.id,
    revision: revision.id,
    member: integrator.id,
  };
  before = await readEverything();
});
afterAll(() => server.stop());
// Whatever was tried, every revision and every event is what it was.
afterEach(async () => {
  expect(await readEverything()).toEqual(before);
});

async function readEverything() {
  const { owner } = server.database;
  const select = (table: string) =>
    owner.query(`SELECT * FROM ${table} ORDER BY id`, { type: QueryTypes.SELECT });
  return { revisions: await select('revisions'), events: await select('revision_events') };
}

async function errnoOf(connection: Sequelize, statement: string): Promise<number | undefined> {
  const filled = statement.replace(/:(\w+)/g, (_whole, name: keyof typeof ids) => `'${ids[name]}'`);
  return connection.query(filled, { type: QueryTypes.RAW }).then(
    () => 0,
    (error: unknown) => readDatabaseErrno(error),
  );
}

const COPY = `SELECT id, team_id, layout_id, letter, SHA2('{}', 256), '{}', sequence, note, job_name, platform_name,
  layout_name, saved_by_id, saved_by_name, saved_at FROM revisions WHERE id = :revision`;
const COPY_EVENT = `SELECT id, revision_id, 'returned', member_id, member_name, reason, at
  FROM revision_events WHERE revision_id = :revision`;

const CHANGES: readonly (readonly [statement: string, application: number, owner: number])[] = [
  ["UPDATE revisions SET note = 'x' WHERE id = :revision", DENIED, IMMUTABLE],
  ["UPDATE revisions SET content = '{}', hash = SHA2('{}', 256) WHERE id = :revision", DENIED, IMMUTABLE],
  ['DELETE FROM revisions WHERE id = :revision', DENIED, IMMUTABLE],
  [`REPLACE INTO revisions ${COPY}`, DENIED, IMMUTABLE],
  [`INSERT INTO revisions ${COPY} ON DUPLICATE KEY UPDATE note = 'x'`, DENIED, IMMUTABLE],
  [`INSERT INTO revisions ${COPY}`, DUPLICATE, DUPLICATE],
  ['TRUNCATE TABLE revisions', DENIED, TRUNCATE_REFERENCED],
  ["UPDATE revision_events SET kind = 'returned' WHERE revision_id = :revision", DENIED, IMMUTABLE],
  ["DELETE FROM revision_events WHERE revision_id = :revision AND kind = 'frozen'", DENIED, IMMUTABLE],
  [`REPLACE INTO revision_events ${COPY_EVENT}`, DENIED, IMMUTABLE],
  // Everything that a revision hangs on: its whole path up to the team is RESTRICT.
  ['DELETE FROM layouts WHERE id = :layout', REFERENCED, REFERENCED],
  ['DELETE FROM platforms WHERE id = :platform', REFERENCED, REFERENCED],
  ['DELETE FROM jobs WHERE id = :job', REFERENCED, REFERENCED],
  ['DELETE FROM teams WHERE id = :team', REFERENCED, REFERENCED],
  ['DELETE FROM memberships WHERE id = :member', REFERENCED, REFERENCED],
  ['UPDATE layouts SET id = REVERSE(id) WHERE id = :layout', REFERENCED, REFERENCED],
  ['UPDATE memberships SET id = REVERSE(id) WHERE id = :member', REFERENCED, REFERENCED],
  ['REPLACE INTO layouts SELECT * FROM layouts WHERE id = :layout', REFERENCED, REFERENCED],
  [
    'DELETE layouts, platforms FROM layouts JOIN platforms ON platforms.id = layouts.platform_id WHERE layouts.id = :layout',
    REFERENCED,
    REFERENCED,
  ],
];

test.each(CHANGES)('%s is refused', async (statement, application, owner) => {
  expect(await errnoOf(server.database.sequelize, statement)).toBe(application);
  expect(await errnoOf(server.database.owner, statement)).toBe(owner);
});

test.each([
  'TRUNCATE TABLE revision_events',
  'TRUNCATE TABLE revisions',
  'DROP TABLE revision_events',
  'DROP TRIGGER revisions_refuse_update',
  'DROP TRIGGER revision_events_refuse_delete',
  'ALTER TABLE revisions DROP CONSTRAINT revisions_hash',
])('the application may not %s', async (statement) => {
  expect(await errnoOf(server.database.sequelize, statement)).toBe(DENIED);
});

test('with the checks of foreign keys off, the application still removes no revision', async () => {
  await server.database.sequelize.transaction(async (transaction) => {
    const run = (statement: string) =>
      server.database.sequelize.query(statement, { type: QueryTypes.RAW, transaction });
    await run('SET FOREIGN_KEY_CHECKS = 0');
    await expect(run('DELETE FROM revisions')).rejects.toMatchObject({ original: { errno: DENIED } });
    await expect(run('TRUNCATE TABLE revision_events')).rejects.toMatchObject({
      original: { errno: DENIED },
    });
    await run('SET FOREIGN_KEY_CHECKS = 1');
  });
});

test('a revision whose hash is not that of its content is not taken, nor is an event nobody knows', async () => {
  const { sequelize } = server.database;
  const wrong = COPY.replace('SELECT id,', 'SELECT REVERSE(id),')
    .replace('letter,', "'B',")
    .replace("SHA2('{}', 256)", 'hash');
  expect(await errnoOf(sequelize, `INSERT INTO revisions ${wrong}`)).toBe(CHECK_FAILED);
  const event = (kind: string) =>
    `INSERT INTO revision_events (revision_id, kind, member_id, member_name, at)
     VALUES (:revision, '${kind}', :member, 'x', NOW(3))`;
  expect(await errnoOf(sequelize, event('melted'))).toBe(CHECK_FAILED);
  expect(await errnoOf(sequelize, event('frozen'))).toBe(DUPLICATE);
});

test('a model that is changed in memory is not saved', async () => {
  const revision = await Revision.findByPk(ids.revision, { rejectOnEmpty: true });
  await expect(revision.update({ note: 'x' })).rejects.toMatchObject({ original: { errno: DENIED } });
  await expect(revision.destroy()).rejects.toMatchObject({ original: { errno: DENIED } });
});

test('every foreign key towards revisions and their events, and on their way up, is RESTRICT', async () => {
  const rows = await server.database.owner.query<{ name: string; onDelete: string; onUpdate: string }>(
    `SELECT constraint_name AS name, delete_rule AS onDelete, update_rule AS onUpdate
     FROM information_schema.referential_constraints WHERE constraint_schema = DATABASE()`,
    { type: QueryTypes.SELECT },
  );
  expect(rows.length).toBeGreaterThan(10);
  expect(rows.filter(({ onDelete }) => onDelete !== 'RESTRICT')).toEqual([]);
  expect(rows.filter(({ onUpdate }) => !['RESTRICT', 'NO ACTION'].includes(onUpdate))).toEqual([]);
});

test('the hash is the SHA-256 of what is stored', async () => {
  const revision = await Revision.findByPk(ids.revision, { rejectOnEmpty: true });
  expect(createHash('sha256').update(revision.content, 'utf8').digest('hex')).toBe(revision.hash);
});
