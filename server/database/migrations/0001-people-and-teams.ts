import type { RunStatement } from '../migrate';

const OPTIONS = 'ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci';
const ID = 'CHAR(26) CHARACTER SET ascii COLLATE ascii_bin';
const HASH = 'CHAR(64) CHARACTER SET ascii COLLATE ascii_bin';
const EMAIL = 'VARCHAR(254) CHARACTER SET utf8mb4 COLLATE utf8mb4_bin';

/** People, teams, memberships, sessions, invitations, audit, the task queue and the caught mail. */
export async function up(run: RunStatement): Promise<void> {
  await run(`CREATE TABLE teams (
    id ${ID} NOT NULL PRIMARY KEY,
    name VARCHAR(120) NOT NULL,
    demo TINYINT(1) NOT NULL DEFAULT 0,
    created_at DATETIME(3) NOT NULL,
    updated_at DATETIME(3) NOT NULL
  ) ${OPTIONS}`);

  await run(`CREATE TABLE people (
    id ${ID} NOT NULL PRIMARY KEY,
    email ${EMAIL} NOT NULL,
    name VARCHAR(120) NOT NULL,
    password_hash VARCHAR(80) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    created_at DATETIME(3) NOT NULL,
    updated_at DATETIME(3) NOT NULL,
    UNIQUE KEY people_email (email)
  ) ${OPTIONS}`);

  await run(`CREATE TABLE memberships (
    id ${ID} NOT NULL PRIMARY KEY,
    team_id ${ID} NOT NULL,
    person_id ${ID} NOT NULL,
    roles VARCHAR(120) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    deactivated_at DATETIME(3) NULL,
    created_at DATETIME(3) NOT NULL,
    updated_at DATETIME(3) NOT NULL,
    UNIQUE KEY memberships_team_person (team_id, person_id),
    KEY memberships_person (person_id),
    CONSTRAINT memberships_team FOREIGN KEY (team_id) REFERENCES teams (id) ON DELETE RESTRICT,
    CONSTRAINT memberships_person FOREIGN KEY (person_id) REFERENCES people (id) ON DELETE RESTRICT
  ) ${OPTIONS}`);

  await run(`CREATE TABLE sessions (
    sid VARCHAR(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL PRIMARY KEY,
    person_id ${ID} NULL,
    expires DATETIME(3) NOT NULL,
    data MEDIUMTEXT NOT NULL,
    created_at DATETIME(3) NOT NULL,
    updated_at DATETIME(3) NOT NULL,
    KEY sessions_person (person_id),
    KEY sessions_expires (expires)
  ) ${OPTIONS}`);

  await run(`CREATE TABLE invitations (
    id ${ID} NOT NULL PRIMARY KEY,
    team_id ${ID} NOT NULL,
    email ${EMAIL} NOT NULL,
    roles VARCHAR(120) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    token_hash ${HASH} NOT NULL,
    invited_by_id ${ID} NOT NULL,
    expires_at DATETIME(3) NOT NULL,
    accepted_at DATETIME(3) NULL,
    withdrawn_at DATETIME(3) NULL,
    created_at DATETIME(3) NOT NULL,
    updated_at DATETIME(3) NOT NULL,
    UNIQUE KEY invitations_token (token_hash),
    KEY invitations_team (team_id, created_at),
    CONSTRAINT invitations_team FOREIGN KEY (team_id) REFERENCES teams (id) ON DELETE RESTRICT,
    CONSTRAINT invitations_invited_by FOREIGN KEY (invited_by_id) REFERENCES memberships (id) ON DELETE RESTRICT
  ) ${OPTIONS}`);

  await run(`CREATE TABLE password_resets (
    id ${ID} NOT NULL PRIMARY KEY,
    person_id ${ID} NOT NULL,
    token_hash ${HASH} NOT NULL,
    expires_at DATETIME(3) NOT NULL,
    used_at DATETIME(3) NULL,
    created_at DATETIME(3) NOT NULL,
    updated_at DATETIME(3) NOT NULL,
    UNIQUE KEY password_resets_token (token_hash),
    KEY password_resets_person (person_id),
    CONSTRAINT password_resets_person FOREIGN KEY (person_id) REFERENCES people (id) ON DELETE RESTRICT
  ) ${OPTIONS}`);

  await run(`CREATE TABLE audit (
    id BIGINT UNSIGNED NOT NULL AUTO_INCREMENT PRIMARY KEY,
    team_id ${ID} NULL,
    person_id ${ID} NULL,
    action VARCHAR(60) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    subject_id ${ID} NULL,
    details TEXT NOT NULL,
    created_at DATETIME(3) NOT NULL,
    KEY audit_team (team_id, id),
    CONSTRAINT audit_team FOREIGN KEY (team_id) REFERENCES teams (id) ON DELETE RESTRICT,
    CONSTRAINT audit_person FOREIGN KEY (person_id) REFERENCES people (id) ON DELETE RESTRICT
  ) ${OPTIONS}`);

  await run(`CREATE TABLE tasks (
    id ${ID} NOT NULL PRIMARY KEY,
    team_id ${ID} NULL,
    kind VARCHAR(40) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    payload LONGTEXT NOT NULL,
    state ENUM('waiting', 'running', 'done', 'failed', 'cancelled') NOT NULL DEFAULT 'waiting',
    attempts INT UNSIGNED NOT NULL DEFAULT 0,
    run_at DATETIME(3) NOT NULL,
    lease VARCHAR(26) CHARACTER SET ascii COLLATE ascii_bin NULL,
    lease_until DATETIME(3) NULL,
    progress DOUBLE NOT NULL DEFAULT 0,
    result LONGTEXT NULL,
    problem VARCHAR(500) NULL,
    created_at DATETIME(3) NOT NULL,
    updated_at DATETIME(3) NOT NULL,
    KEY tasks_due (state, run_at),
    CONSTRAINT tasks_team FOREIGN KEY (team_id) REFERENCES teams (id) ON DELETE RESTRICT
  ) ${OPTIONS}`);

  await run(`CREATE TABLE caught_mails (
    id BIGINT UNSIGNED NOT NULL AUTO_INCREMENT PRIMARY KEY,
    recipient ${EMAIL} NOT NULL,
    subject VARCHAR(250) NOT NULL,
    body MEDIUMTEXT NOT NULL,
    received_at DATETIME(3) NOT NULL
  ) ${OPTIONS}`);
}
