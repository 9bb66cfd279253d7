export async function up({ context: query }) {
  await query.sequelize.query(`CREATE TABLE notebooks (
    id TEXT PRIMARY KEY, title TEXT NOT NULL, purpose TEXT NOT NULL DEFAULT '',
    owner_id TEXT NOT NULL REFERENCES people(id), created_by_id TEXT NOT NULL REFERENCES people(id),
    archived_at DATETIME, version INTEGER NOT NULL DEFAULT 1, created_at DATETIME NOT NULL, updated_at DATETIME NOT NULL)`);
  await query.sequelize.query('CREATE INDEX notebooks_owner ON notebooks(owner_id)');
  await query.sequelize.query(`CREATE TABLE memberships (
    id TEXT PRIMARY KEY, notebook_id TEXT NOT NULL REFERENCES notebooks(id),
    person_id TEXT NOT NULL REFERENCES people(id), role TEXT NOT NULL CHECK (role IN ('contributor', 'reader')),
    ended_at DATETIME, created_at DATETIME NOT NULL, updated_at DATETIME NOT NULL)`);
  await query.sequelize.query(
    'CREATE UNIQUE INDEX memberships_live ON memberships(notebook_id, person_id) WHERE ended_at IS NULL',
  );
  await query.sequelize.query('CREATE INDEX memberships_person ON memberships(person_id)');
  await query.sequelize.query(`CREATE TABLE share_links (
    id TEXT PRIMARY KEY, notebook_id TEXT NOT NULL REFERENCES notebooks(id), label TEXT NOT NULL,
    token_hash TEXT NOT NULL UNIQUE, expires_at DATETIME NOT NULL, revoked_at DATETIME,
    opened_count INTEGER NOT NULL DEFAULT 0, last_opened_at DATETIME,
    created_by_id TEXT NOT NULL REFERENCES people(id), created_at DATETIME NOT NULL, updated_at DATETIME NOT NULL)`);
  await query.sequelize.query('CREATE INDEX share_links_notebook ON share_links(notebook_id)');
  await query.sequelize.query(`CREATE TABLE share_sessions (
    id TEXT PRIMARY KEY, share_link_id TEXT NOT NULL REFERENCES share_links(id), expires_at DATETIME NOT NULL,
    created_at DATETIME NOT NULL, updated_at DATETIME NOT NULL)`);
}

export async function down({ context: query }) {
  for (const table of ['share_sessions', 'share_links', 'memberships', 'notebooks'])
    await query.sequelize.query(`DROP TABLE ${table}`);
}
