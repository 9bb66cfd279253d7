export async function up({ context: query }) {
  await query.sequelize.query(`CREATE TABLE laboratories (
    id TEXT PRIMARY KEY, name TEXT NOT NULL, time_zone TEXT NOT NULL, demo TINYINT(1) NOT NULL CHECK (demo IN (0, 1)),
    created_at DATETIME NOT NULL, updated_at DATETIME NOT NULL)`);
  await query.sequelize.query(`CREATE TABLE people (
    id TEXT PRIMARY KEY, name TEXT NOT NULL, email TEXT NOT NULL UNIQUE COLLATE NOCASE,
    password_hash TEXT, role TEXT NOT NULL CHECK (role IN ('administrator', 'pi', 'analyst', 'viewer')),
    active TINYINT(1) NOT NULL DEFAULT 1, welcomed_at DATETIME, created_at DATETIME NOT NULL, updated_at DATETIME NOT NULL)`);
  await query.sequelize.query(`CREATE TABLE sessions (
    id TEXT PRIMARY KEY, person_id TEXT NOT NULL REFERENCES people(id), last_seen_at DATETIME NOT NULL,
    idle_expires_at DATETIME NOT NULL, expires_at DATETIME NOT NULL, ended_at DATETIME,
    created_at DATETIME NOT NULL, updated_at DATETIME NOT NULL)`);
  await query.sequelize.query('CREATE INDEX sessions_person ON sessions(person_id)');
  await query.sequelize.query(`CREATE TABLE password_links (
    id TEXT PRIMARY KEY, person_id TEXT NOT NULL REFERENCES people(id), token_hash TEXT NOT NULL UNIQUE,
    purpose TEXT NOT NULL CHECK (purpose IN ('invitation', 'reset')), expires_at DATETIME NOT NULL, used_at DATETIME, withdrawn_at DATETIME,
    created_at DATETIME NOT NULL, updated_at DATETIME NOT NULL)`);
  await query.sequelize.query(`CREATE TABLE api_tokens (
    id TEXT PRIMARY KEY, person_id TEXT NOT NULL REFERENCES people(id), name TEXT NOT NULL,
    token_hash TEXT NOT NULL UNIQUE, scope TEXT NOT NULL CHECK (scope IN ('read', 'write')),
    expires_at DATETIME NOT NULL, revoked_at DATETIME, last_used_at DATETIME, created_at DATETIME NOT NULL, updated_at DATETIME NOT NULL)`);
}

export async function down({ context: query }) {
  for (const table of ['api_tokens', 'password_links', 'sessions', 'people', 'laboratories'])
    await query.sequelize.query(`DROP TABLE ${table}`);
}
