/**
 * What the second wavelength of a reading rule read, beside the reading as it came. Readings from before hold the
 * difference in `value` and nothing here; they are calculated as they were.
 */
export async function up({ context: query }) {
  await query.sequelize.query(
    'ALTER TABLE readings ADD COLUMN minus_value REAL CHECK (minus_value IS NULL OR value IS NOT NULL)',
  );
}

export async function down({ context: query }) {
  await query.sequelize.query('ALTER TABLE readings DROP COLUMN minus_value');
}
