import type { RunStatement } from '../migrate';

const OPTIONS = 'ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci';
const ID = 'CHAR(26) CHARACTER SET ascii COLLATE ascii_bin';
const BINARY_TEXT = 'LONGTEXT CHARACTER SET utf8mb4 COLLATE utf8mb4_bin';

/** Jobs, their platforms and layouts, the shelf of parts, and the operations that layouts are made of. */
export async function up(run: RunStatement): Promise<void> {
  await run(`CREATE TABLE jobs (
    id ${ID} NOT NULL PRIMARY KEY,
    team_id ${ID} NOT NULL,
    name VARCHAR(120) NOT NULL,
    customer VARCHAR(120) NOT NULL,
    archived_at DATETIME(3) NULL,
    created_at DATETIME(3) NOT NULL,
    updated_at DATETIME(3) NOT NULL,
    KEY jobs_newest (team_id, updated_at, id),
    CONSTRAINT jobs_team FOREIGN KEY (team_id) REFERENCES teams (id) ON DELETE RESTRICT
  ) ${OPTIONS}`);

  await run(`CREATE TABLE platforms (
    id ${ID} NOT NULL PRIMARY KEY,
    team_id ${ID} NOT NULL,
    job_id ${ID} NOT NULL,
    name VARCHAR(120) NOT NULL,
    kind VARCHAR(20) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    document ${BINARY_TEXT} NOT NULL,
    created_at DATETIME(3) NOT NULL,
    updated_at DATETIME(3) NOT NULL,
    KEY platforms_job (job_id, created_at),
    CONSTRAINT platforms_team FOREIGN KEY (team_id) REFERENCES teams (id) ON DELETE RESTRICT,
    CONSTRAINT platforms_job FOREIGN KEY (job_id) REFERENCES jobs (id) ON DELETE RESTRICT
  ) ${OPTIONS}`);

  await run(`CREATE TABLE layouts (
    id ${ID} NOT NULL PRIMARY KEY,
    team_id ${ID} NOT NULL,
    platform_id ${ID} NOT NULL,
    name VARCHAR(120) NOT NULL,
    sequence INT UNSIGNED NOT NULL DEFAULT 0,
    document ${BINARY_TEXT} NOT NULL,
    comment_count INT UNSIGNED NOT NULL DEFAULT 0,
    created_at DATETIME(3) NOT NULL,
    updated_at DATETIME(3) NOT NULL,
    KEY layouts_platform (platform_id, created_at),
    CONSTRAINT layouts_team FOREIGN KEY (team_id) REFERENCES teams (id) ON DELETE RESTRICT,
    CONSTRAINT layouts_platform FOREIGN KEY (platform_id) REFERENCES platforms (id) ON DELETE RESTRICT
  ) ${OPTIONS}`);

  // Clustered by the one order of a layout, so that appending and reading on are both sequential.
  await run(`CREATE TABLE operations (
    layout_id ${ID} NOT NULL,
    sequence INT UNSIGNED NOT NULL,
    id ${ID} NOT NULL,
    member_id ${ID} NOT NULL,
    member_name VARCHAR(120) NOT NULL,
    version INT UNSIGNED NOT NULL,
    changes ${BINARY_TEXT} NOT NULL,
    committed_at DATETIME(3) NOT NULL,
    PRIMARY KEY (layout_id, sequence),
    UNIQUE KEY operations_id (id),
    KEY operations_members (layout_id, member_id, committed_at),
    CONSTRAINT operations_layout FOREIGN KEY (layout_id) REFERENCES layouts (id) ON DELETE RESTRICT ON UPDATE RESTRICT,
    CONSTRAINT operations_member FOREIGN KEY (member_id) REFERENCES memberships (id) ON DELETE RESTRICT ON UPDATE RESTRICT
  ) ${OPTIONS}`);

  await run(`CREATE TABLE parts (
    id ${ID} NOT NULL PRIMARY KEY,
    team_id ${ID} NOT NULL,
    kind VARCHAR(20) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    name VARCHAR(120) NOT NULL,
    content ${BINARY_TEXT} NOT NULL,
    archived_at DATETIME(3) NULL,
    created_at DATETIME(3) NOT NULL,
    updated_at DATETIME(3) NOT NULL,
    KEY parts_shelf (team_id, name, id),
    CONSTRAINT parts_team FOREIGN KEY (team_id) REFERENCES teams (id) ON DELETE RESTRICT
  ) ${OPTIONS}`);
}
