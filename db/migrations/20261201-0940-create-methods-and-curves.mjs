export async function up({ context: query }) {
  await query.sequelize.query(`CREATE TABLE methods (
    id TEXT PRIMARY KEY, notebook_id TEXT NOT NULL REFERENCES notebooks(id),
    lineage_id TEXT NOT NULL, version INTEGER NOT NULL, supersedes_id TEXT REFERENCES methods(id),
    analyte TEXT NOT NULL, basis TEXT NOT NULL, formula_mass REAL, unit TEXT NOT NULL,
    signal TEXT NOT NULL CHECK (signal IN ('absorbance', 'transmittance', 'percentTransmittance')),
    wavelength_nm REAL NOT NULL, reading_rule JSON NOT NULL,
    path_length_mm REAL NOT NULL, path_length_u_mm REAL, path_length_known BOOLEAN NOT NULL,
    standards_relative_u REAL,
    blank_rule TEXT NOT NULL CHECK (blank_rule IN ('none', 'level', 'subtract')),
    model TEXT NOT NULL, weighting TEXT NOT NULL, confidence REAL NOT NULL, absorbance_limit REAL NOT NULL,
    limits JSON NOT NULL, hazard_note TEXT NOT NULL DEFAULT '',
    created_by_id TEXT NOT NULL REFERENCES people(id), created_at DATETIME NOT NULL, updated_at DATETIME NOT NULL,
    UNIQUE (lineage_id, version))`);
  await query.sequelize.query(`CREATE TABLE curves (
    id TEXT PRIMARY KEY, notebook_id TEXT NOT NULL REFERENCES notebooks(id), method_id TEXT NOT NULL REFERENCES methods(id),
    lineage_id TEXT NOT NULL, version INTEGER NOT NULL, supersedes_id TEXT REFERENCES curves(id),
    title TEXT NOT NULL, status TEXT NOT NULL CHECK (status IN ('saved', 'superseded', 'void')),
    result JSON NOT NULL, engine_version TEXT NOT NULL, reason TEXT, void_reason TEXT,
    created_by_id TEXT NOT NULL REFERENCES people(id), created_at DATETIME NOT NULL, updated_at DATETIME NOT NULL,
    UNIQUE (lineage_id, version))`);
  await query.sequelize.query('CREATE INDEX curves_notebook ON curves(notebook_id, created_at)');
  await query.sequelize.query(`CREATE TABLE standards (
    id TEXT PRIMARY KEY, notebook_id TEXT NOT NULL REFERENCES notebooks(id), curve_id TEXT NOT NULL REFERENCES curves(id),
    role TEXT NOT NULL CHECK (role IN ('standard', 'blank')), position INTEGER NOT NULL, name TEXT NOT NULL,
    concentration REAL NOT NULL, path_length_mm REAL NOT NULL, excluded_reason TEXT,
    created_at DATETIME NOT NULL, updated_at DATETIME NOT NULL)`);
  await query.sequelize.query('CREATE INDEX standards_curve ON standards(curve_id, position)');
}

export async function down({ context: query }) {
  for (const table of ['standards', 'curves', 'methods']) await query.sequelize.query(`DROP TABLE ${table}`);
}
