import { readSourceBytes } from '@/db/queries/source-files';
import { AppError } from '@/lib/errors';
import { sourceFileParams } from '@/lib/schemas/spectrum-upload';
import { route } from '@/app/_server/route';

/** An older browser takes the plain name, the others the exact one (RFC 6266). */
function attachment(name: string): string {
  const plain = name.replace(/[^\w. -]/g, '_');
  return `attachment; filename="${plain}"; filename*=UTF-8''${encodeURIComponent(name).replace(/['()*]/g, (c) => `%${c.charCodeAt(0).toString(16)}`)}`;
}

/** The bytes as they came. They leave only when they still give the hash that was written down with them. */
export const GET = route({ params: sourceFileParams }, async (actor, { params }) => {
  const { name, sha256, bytes, intact } = await readSourceBytes(actor, params.sourceFileId);
  if (!intact)
    throw new AppError(
      'CONFLICT',
      `The stored bytes of ${name} no longer give the SHA-256 ${sha256}. Restore the database from a backup`,
    );
  return new Response(new Uint8Array(bytes), {
    headers: {
      'content-type': 'application/octet-stream',
      'content-disposition': attachment(name),
      'content-length': String(bytes.length),
      etag: `"${sha256}"`,
      // RFC 9530: the digest of the bytes, so that who downloads can check them too
      'repr-digest': `sha-256=:${Buffer.from(sha256, 'hex').toString('base64')}:`,
      'cache-control': 'private, no-cache',
    },
  });
});
