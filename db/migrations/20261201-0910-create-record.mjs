/** The record only grows: the database itself refuses to change or remove an entry. */
export async function up({ context: query }) {
  await query.sequelize.query(`CREATE TABLE record_entries (
    id INTEGER PRIMARY KEY AUTOINCREMENT, at DATETIME NOT NULL,
    actor_kind TEXT NOT NULL, actor_via TEXT NOT NULL, person_id TEXT, actor_name TEXT NOT NULL,
    notebook_id TEXT, kind TEXT NOT NULL, subject_id TEXT, subject_name TEXT, verb TEXT NOT NULL,
    "from" JSON, "to" JSON, why TEXT)`);
  await query.sequelize.query('CREATE INDEX record_entries_notebook ON record_entries(notebook_id, id)');
  await query.sequelize.query('CREATE INDEX record_entries_subject ON record_entries(subject_id, id)');
  await query.sequelize.query(`CREATE TRIGGER record_entries_no_update BEFORE UPDATE ON record_entries
    BEGIN SELECT RAISE(ABORT, 'the record is append-only'); END`);
  await query.sequelize.query(`CREATE TRIGGER record_entries_no_delete BEFORE DELETE ON record_entries
    BEGIN SELECT RAISE(ABORT, 'the record is append-only'); END`);
}

export async function down({ context: query }) {
  await query.sequelize.query('DROP TABLE record_entries');
}
