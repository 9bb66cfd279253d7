import { loadBatch, recordExport } from '@/db/queries/batches';
import { resultsCsv, resultsFileName } from '@/lib/batch/results-csv';
import { batchParams, resultsQuery } from '@/lib/schemas/batch';
import { route } from '@/app/_server/route';

/** Spreadsheets take a file for UTF-8 only when it starts with this mark; programs would rather do without. */
const BYTE_ORDER_MARK = '\uFEFF';

/** The results as a CSV file; that they left the notebook is written into its record. */
export const GET = route({ params: batchParams, query: resultsQuery }, async (actor, { params, query }) => {
  const batch = await loadBatch(actor, params.batchId);
  const text = resultsCsv(batch);
  await recordExport(actor, batch.id, 'CSV');
  return new Response(query.for === 'spreadsheet' ? BYTE_ORDER_MARK + text : text, {
    headers: {
      'content-type': 'text/csv; charset=utf-8; header=present',
      'content-disposition': `attachment; filename="${resultsFileName(batch)}"`,
      'cache-control': 'private, no-store',
    },
  });
});
