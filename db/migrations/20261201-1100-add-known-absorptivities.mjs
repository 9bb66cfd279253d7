const KEPT = 'curve_id TEXT NOT NULL REFERENCES curves(id)';
const MAY_BE_EMPTY = 'curve_id TEXT REFERENCES curves(id)';

/**
 * Known absorptivities, and batches that are read on one of them instead of on a curve: exactly one of the two.
 * SQLite cannot drop a NOT NULL with ALTER TABLE; its manual ("Making Other Kinds Of Table Schema Changes") lets the
 * stored text of the table be edited for that, since no row on disk changes.
 */
export async function up({ context: query }) {
  await query.sequelize.transaction(async (transaction) => {
    const run = (sql) => query.sequelize.query(sql, { transaction });
    await run(`CREATE TABLE absorptivities (
    id TEXT PRIMARY KEY, notebook_id TEXT NOT NULL REFERENCES notebooks(id),
    lineage_id TEXT NOT NULL, version INTEGER NOT NULL, supersedes_id TEXT REFERENCES absorptivities(id),
    title TEXT NOT NULL, status TEXT NOT NULL CHECK (status IN ('saved', 'superseded', 'void')),
    analyte TEXT NOT NULL, basis TEXT NOT NULL, formula_mass REAL, unit TEXT NOT NULL,
    signal TEXT NOT NULL CHECK (signal IN ('absorbance', 'transmittance', 'percentTransmittance')),
    kind TEXT NOT NULL CHECK (kind IN ('molar', 'percent', 'specific')),
    value REAL NOT NULL CHECK (value > 0), u REAL CHECK (u >= 0), source TEXT NOT NULL CHECK (source <> ''),
    conditions TEXT NOT NULL DEFAULT '', wavelength_nm REAL NOT NULL, reading_rule JSON NOT NULL,
    path_length_mm REAL NOT NULL, path_length_u_mm REAL, reading_sd REAL,
    confidence REAL NOT NULL, absorbance_limit REAL NOT NULL, hazard_note TEXT NOT NULL DEFAULT '',
    reason TEXT, void_reason TEXT,
    created_by_id TEXT NOT NULL REFERENCES people(id), created_at DATETIME NOT NULL, updated_at DATETIME NOT NULL,
    UNIQUE (lineage_id, version))`);
    await run('CREATE INDEX absorptivities_notebook ON absorptivities(notebook_id, created_at)');
    await run(`ALTER TABLE batches ADD COLUMN absorptivity_id TEXT REFERENCES absorptivities(id)
    CHECK ((curve_id IS NULL) <> (absorptivity_id IS NULL))`);
    await run('CREATE INDEX batches_absorptivity ON batches(absorptivity_id)');
    await rewriteBatches(run, KEPT, MAY_BE_EMPTY);
  });
}

/** Batches on an absorptivity have no curve to go back to, so with any of them there is no way down. */
export async function down({ context: query }) {
  await query.sequelize.transaction(async (transaction) => {
    const run = (sql) => query.sequelize.query(sql, { transaction });
    const [[{ count }]] = await run('SELECT count(*) AS count FROM batches WHERE curve_id IS NULL');
    if (count > 0)
      throw new Error(`${count} batches are read on a known absorptivity and need this migration`);
    await rewriteBatches(run, MAY_BE_EMPTY, KEPT);
    await run('DROP INDEX batches_absorptivity');
    await run('ALTER TABLE batches DROP COLUMN absorptivity_id');
    await run('DROP TABLE absorptivities');
  });
}

async function rewriteBatches(run, from, to) {
  const [[{ schema_version: version }]] = await run('PRAGMA schema_version');
  await run('PRAGMA writable_schema = ON');
  await run(`UPDATE sqlite_master SET sql = replace(sql, '${from}', '${to}')
    WHERE type = 'table' AND name = 'batches'`);
  await run(`PRAGMA schema_version = ${version + 1}`);
  await run('PRAGMA writable_schema = OFF');
  const [[{ integrity_check: sound }]] = await run('PRAGMA integrity_check(batches)');
  const [[{ sql }]] = await run("SELECT sql FROM sqlite_master WHERE type = 'table' AND name = 'batches'");
  if (sound !== 'ok' || !sql.includes(to))
    throw new Error(`the table of batches was not rewritten: ${sound}`);
}
