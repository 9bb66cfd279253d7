import Link from 'next/link';
import { Card } from '@/components/ui/card';
import { RowHead, Table, Td, Th } from '@/components/ui/table';
import { formatDateTime } from '@/lib/format/dates';
import type { CurveVersionView } from '@/lib/views/curve';
import { CurveStatusPill } from './curve-status';

const why = ({ voidReason, reason, version }: CurveVersionView) =>
  voidReason ?? reason ?? (version === 1 ? 'first version' : '');

/** The versions of a curve or of a known absorptivity, newest first, each with why it was made. */
export function VersionTable({
  label,
  versions,
  shownId,
  base,
  timeZone,
}: {
  label: string;
  versions: readonly CurveVersionView[];
  /** the version whose page this is */
  shownId: string;
  /** the address under which versions have their pages */
  base: string;
  timeZone: string;
}) {
  return (
    <Card flush title="Versions" aside="kept, and never changed">
      <Table label={label}>
        <thead>
          <tr>
            <Th>Version</Th>
            <Th>Status</Th>
            <Th>Why</Th>
            <Th>Saved</Th>
          </tr>
        </thead>
        <tbody>
          {versions.map((version) => (
            <tr key={version.id}>
              <RowHead>
                {version.id === shownId ? (
                  <span aria-current="true">Version {version.version}, shown here</span>
                ) : (
                  <Link className="text-uv underline-offset-2 hover:underline" href={`${base}/${version.id}`}>
                    Version {version.version}
                  </Link>
                )}
              </RowHead>
              <Td>
                <CurveStatusPill curve={{ status: version.status, newer: null }} />
              </Td>
              <Td>{why(version)}</Td>
              <Td className="text-sm whitespace-nowrap text-ink-2">
                {formatDateTime(version.createdAt, timeZone)}, {version.createdBy}
              </Td>
            </tr>
          ))}
        </tbody>
      </Table>
    </Card>
  );
}
