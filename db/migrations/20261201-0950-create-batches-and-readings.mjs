export async function up({ context: query }) {
  await query.sequelize.query(`CREATE TABLE batches (
    id TEXT PRIMARY KEY, notebook_id TEXT NOT NULL REFERENCES notebooks(id), curve_id TEXT NOT NULL REFERENCES curves(id),
    lineage_id TEXT NOT NULL, version INTEGER NOT NULL, supersedes_id TEXT REFERENCES batches(id),
    title TEXT NOT NULL, note TEXT NOT NULL DEFAULT '', status TEXT NOT NULL CHECK (status IN ('open', 'superseded', 'void')),
    void_reason TEXT, created_by_id TEXT NOT NULL REFERENCES people(id),
    created_at DATETIME NOT NULL, updated_at DATETIME NOT NULL, UNIQUE (lineage_id, version))`);
  await query.sequelize.query('CREATE INDEX batches_notebook ON batches(notebook_id, created_at)');
  await query.sequelize.query('CREATE INDEX batches_curve ON batches(curve_id)');
  await query.sequelize.query(`CREATE TABLE determinations (
    id TEXT PRIMARY KEY, notebook_id TEXT NOT NULL REFERENCES notebooks(id), batch_id TEXT NOT NULL REFERENCES batches(id),
    position INTEGER NOT NULL, sample TEXT NOT NULL, note TEXT NOT NULL DEFAULT '',
    path_length_mm REAL NOT NULL, path_length_u_mm REAL, dilution JSON NOT NULL,
    result JSON NOT NULL, engine_version TEXT NOT NULL, version INTEGER NOT NULL DEFAULT 1,
    voided_at DATETIME, void_reason TEXT,
    created_by_id TEXT NOT NULL REFERENCES people(id), created_at DATETIME NOT NULL, updated_at DATETIME NOT NULL)`);
  await query.sequelize.query('CREATE INDEX determinations_batch ON determinations(batch_id, position)');
  await query.sequelize.query(`CREATE TABLE readings (
    id TEXT PRIMARY KEY, notebook_id TEXT NOT NULL REFERENCES notebooks(id),
    standard_id TEXT REFERENCES standards(id), determination_id TEXT REFERENCES determinations(id),
    position INTEGER NOT NULL, value REAL, gap_reason TEXT, gap_text TEXT,
    signal TEXT NOT NULL CHECK (signal IN ('absorbance', 'transmittance', 'percentTransmittance')),
    origin TEXT NOT NULL CHECK (origin IN ('typed', 'spectrum')), spectrum_id TEXT REFERENCES spectra(id),
    rule JSON, recipe JSON, path_length_mm REAL NOT NULL, excluded_reason TEXT,
    supersedes_id TEXT REFERENCES readings(id), superseded_at DATETIME, reason TEXT,
    created_by_id TEXT NOT NULL REFERENCES people(id), created_at DATETIME NOT NULL, updated_at DATETIME NOT NULL,
    CHECK ((standard_id IS NULL) <> (determination_id IS NULL)),
    CHECK ((value IS NULL) = (gap_reason IS NOT NULL)))`);
  await query.sequelize.query('CREATE INDEX readings_standard ON readings(standard_id, position)');
  await query.sequelize.query('CREATE INDEX readings_determination ON readings(determination_id, position)');
}

export async function down({ context: query }) {
  for (const table of ['readings', 'determinations', 'batches'])
    await query.sequelize.query(`DROP TABLE ${table}`);
}
