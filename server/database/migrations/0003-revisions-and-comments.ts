import type { RunStatement } from '../migrate';

const OPTIONS = 'ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci';
const ID = 'CHAR(26) CHARACTER SET ascii COLLATE ascii_bin';
const BINARY_TEXT = 'LONGTEXT CHARACTER SET utf8mb4 COLLATE utf8mb4_bin';
const RESTRICT = 'ON DELETE RESTRICT ON UPDATE RESTRICT';

/** Revisions and their events, both immutable from their INSERT, and comments. */
export async function up(run: RunStatement): Promise<void> {
  // `content` is the canonical JSON (RFC 8785) whose SHA-256 is `hash`; the database itself checks that they agree.
  await run(`CREATE TABLE revisions (
    id ${ID} NOT NULL PRIMARY KEY,
    team_id ${ID} NOT NULL,
    layout_id ${ID} NOT NULL,
    letter VARCHAR(4) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    hash CHAR(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    content ${BINARY_TEXT} NOT NULL,
    sequence INT UNSIGNED NOT NULL,
    note VARCHAR(1000) NOT NULL,
    job_name VARCHAR(120) NOT NULL,
    platform_name VARCHAR(120) NOT NULL,
    layout_name VARCHAR(120) NOT NULL,
    saved_by_id ${ID} NOT NULL,
    saved_by_name VARCHAR(120) NOT NULL,
    saved_at DATETIME(3) NOT NULL,
    UNIQUE KEY revisions_letter (layout_id, letter),
    KEY revisions_team (team_id, saved_at),
    CONSTRAINT revisions_hash CHECK (CAST(hash AS BINARY) = CAST(SHA2(content, 256) AS BINARY)),
    CONSTRAINT revisions_team FOREIGN KEY (team_id) REFERENCES teams (id) ${RESTRICT},
    CONSTRAINT revisions_layout FOREIGN KEY (layout_id) REFERENCES layouts (id) ${RESTRICT},
    CONSTRAINT revisions_saved_by FOREIGN KEY (saved_by_id) REFERENCES memberships (id) ${RESTRICT}
  ) ${OPTIONS}`);

  // No revision comes into the same state twice, whatever the application does.
  await run(`CREATE TABLE revision_events (
    id BIGINT UNSIGNED NOT NULL AUTO_INCREMENT PRIMARY KEY,
    revision_id ${ID} NOT NULL,
    kind VARCHAR(20) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    member_id ${ID} NOT NULL,
    member_name VARCHAR(120) NOT NULL,
    reason VARCHAR(1000) NULL,
    at DATETIME(3) NOT NULL,
    UNIQUE KEY revision_events_kind (revision_id, kind),
    CONSTRAINT revision_events_known CHECK (kind IN ('saved', 'submitted', 'returned', 'frozen', 'superseded')),
    CONSTRAINT revision_events_revision FOREIGN KEY (revision_id) REFERENCES revisions (id) ${RESTRICT},
    CONSTRAINT revision_events_member FOREIGN KEY (member_id) REFERENCES memberships (id) ${RESTRICT}
  ) ${OPTIONS}`);

  for (const table of ['revisions', 'revision_events']) {
    for (const verb of ['UPDATE', 'DELETE']) {
      await run(`CREATE TRIGGER ${table}_refuse_${verb.toLowerCase()} BEFORE ${verb} ON ${table} FOR EACH ROW
        SIGNAL SQLSTATE '45000' SET MYSQL_ERRNO = 31001, MESSAGE_TEXT = '${table} are immutable'`);
    }
  }

  await run(`CREATE TABLE comments (
    id ${ID} NOT NULL PRIMARY KEY,
    team_id ${ID} NOT NULL,
    layout_id ${ID} NOT NULL,
    revision_id ${ID} NULL,
    number INT UNSIGNED NOT NULL,
    target TEXT NOT NULL,
    text VARCHAR(1000) NOT NULL,
    author_id ${ID} NOT NULL,
    resolved_at DATETIME(3) NULL,
    resolved_by_id ${ID} NULL,
    created_at DATETIME(3) NOT NULL,
    updated_at DATETIME(3) NOT NULL,
    UNIQUE KEY comments_number (layout_id, number),
    KEY comments_revision (revision_id),
    CONSTRAINT comments_team FOREIGN KEY (team_id) REFERENCES teams (id) ${RESTRICT},
    CONSTRAINT comments_layout FOREIGN KEY (layout_id) REFERENCES layouts (id) ${RESTRICT},
    CONSTRAINT comments_revision FOREIGN KEY (revision_id) REFERENCES revisions (id) ${RESTRICT},
    CONSTRAINT comments_author FOREIGN KEY (author_id) REFERENCES memberships (id) ${RESTRICT},
    CONSTRAINT comments_resolved_by FOREIGN KEY (resolved_by_id) REFERENCES memberships (id) ${RESTRICT}
  ) ${OPTIONS}`);

  await run(`CREATE TABLE comment_replies (
    id ${ID} NOT NULL PRIMARY KEY,
    comment_id ${ID} NOT NULL,
    text VARCHAR(1000) NOT NULL,
    author_id ${ID} NOT NULL,
    created_at DATETIME(3) NOT NULL,
    KEY comment_replies_comment (comment_id, created_at),
    CONSTRAINT comment_replies_comment FOREIGN KEY (comment_id) REFERENCES comments (id) ${RESTRICT},
    CONSTRAINT comment_replies_author FOREIGN KEY (author_id) REFERENCES memberships (id) ${RESTRICT}
  ) ${OPTIONS}`);
}
