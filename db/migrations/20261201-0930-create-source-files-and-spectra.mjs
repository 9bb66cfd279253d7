export async function up({ context: query }) {
  await query.sequelize.query(`CREATE TABLE source_files (
    id TEXT PRIMARY KEY, notebook_id TEXT NOT NULL REFERENCES notebooks(id), name TEXT NOT NULL,
    sha256 TEXT NOT NULL, size_bytes INTEGER NOT NULL, reader TEXT NOT NULL, reader_version TEXT NOT NULL,
    dialect TEXT NOT NULL, settings JSON NOT NULL, header_text TEXT NOT NULL, trailer_text TEXT NOT NULL,
    warnings JSON NOT NULL, spectrum_count INTEGER NOT NULL, point_count INTEGER NOT NULL,
    created_by_id TEXT NOT NULL REFERENCES people(id), voided_at DATETIME, void_reason TEXT,
    created_at DATETIME NOT NULL, updated_at DATETIME NOT NULL)`);
  await query.sequelize.query('CREATE INDEX source_files_notebook ON source_files(notebook_id, created_at)');
  await query.sequelize.query('CREATE INDEX source_files_sha ON source_files(sha256)');
  await query.sequelize.query(`CREATE UNIQUE INDEX source_files_once ON source_files(notebook_id, sha256)
    WHERE voided_at IS NULL`);
  await query.sequelize.query(`CREATE TABLE source_bytes (
    source_file_id TEXT PRIMARY KEY REFERENCES source_files(id), encoding TEXT NOT NULL, bytes BLOB NOT NULL)`);
  await query.sequelize.query(`CREATE TABLE spectra (
    id TEXT PRIMARY KEY, notebook_id TEXT NOT NULL REFERENCES notebooks(id),
    source_file_id TEXT NOT NULL REFERENCES source_files(id), name TEXT NOT NULL, position INTEGER NOT NULL,
    block INTEGER NOT NULL, line INTEGER NOT NULL, x_unit TEXT NOT NULL, x_unit_guessed BOOLEAN NOT NULL,
    signal TEXT NOT NULL, signal_guessed BOOLEAN NOT NULL, signal_text TEXT NOT NULL, signal_scale REAL NOT NULL,
    point_count INTEGER NOT NULL, gap_count INTEGER NOT NULL,
    from_nm REAL NOT NULL, to_nm REAL NOT NULL, highest_absorbance REAL, path_length_mm REAL,
    header JSON NOT NULL, gaps JSON NOT NULL, warnings JSON NOT NULL,
    created_by_id TEXT NOT NULL REFERENCES people(id), voided_at DATETIME, void_reason TEXT,
    created_at DATETIME NOT NULL, updated_at DATETIME NOT NULL)`);
  await query.sequelize.query('CREATE INDEX spectra_notebook ON spectra(notebook_id, created_at)');
  await query.sequelize.query('CREATE INDEX spectra_source_file ON spectra(source_file_id)');
  await query.sequelize.query(`CREATE TABLE spectrum_points (
    spectrum_id TEXT PRIMARY KEY REFERENCES spectra(id), x BLOB NOT NULL, y BLOB NOT NULL)`);
  for (const table of ['source_bytes', 'spectrum_points'])
    for (const verb of ['UPDATE', 'DELETE'])
      await query.sequelize.query(`CREATE TRIGGER ${table}_no_${verb.toLowerCase()} BEFORE ${verb} ON ${table}
        BEGIN SELECT RAISE(ABORT, 'raw data are append-only'); END`);
}

export async function down({ context: query }) {
  for (const table of ['spectrum_points', 'spectra', 'source_bytes', 'source_files'])
    await query.sequelize.query(`DROP TABLE ${table}`);
}
