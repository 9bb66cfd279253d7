/** s0 and k of s² = s0² + (k A)², for curves that are weighted by a variance function. */
export async function up({ context: query }) {
  await query.sequelize.query('ALTER TABLE methods ADD COLUMN variance_function JSON');
}

export async function down({ context: query }) {
  await query.sequelize.query('ALTER TABLE methods DROP COLUMN variance_function');
}
