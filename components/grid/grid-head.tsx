import type { GridColumn } from '@/lib/grid/grid-cell';

export function GridHead({ columns }: { columns: readonly GridColumn[] }) {
  return (
    <thead>
      <tr>
        {columns.map((column) => (
          <th
            key={column.key}
            scope="col"
            style={{ minWidth: column.width ?? '6.5rem' }}
            className={`h-8.25 border-r border-b bg-raised px-2 text-xs font-medium whitespace-nowrap text-ink-2 first:sticky first:left-0 first:z-[6] ${
              column.kind === 'text' ? 'text-left' : 'text-right'
            }`}
          >
            {column.label}
            {column.unit && <span className="aside">, {column.unit}</span>}
          </th>
        ))}
      </tr>
    </thead>
  );
}
