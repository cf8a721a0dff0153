import type { CertifiedSet } from '@cairnstep/statistics';
import { formatNumber } from '../../lib/format.ts';
import { Table } from '../../ui/table.tsx';
import type { Column } from '../../ui/table.tsx';

interface Reached {
  readonly set: string;
  readonly name: string;
  readonly digits: number;
  readonly asked: number;
}

/** Digits agreed with the certified values of NIST, figure by figure. */
export function CertifiedDigits({ sets }: { readonly sets: readonly CertifiedSet[] }) {
  const rows = sets.flatMap(({ set, figures }) => figures.map((figure): Reached => ({ set, ...figure })));
  return (
    <div className="grid gap-3">
      <Table
        id="digits"
        caption="Digits agreed with certified data sets"
        columns={columns}
        rows={rows}
        rowKey={({ set, name }) => `${set} ${name}`}
        empty="No certified set belongs to this method."
        fileName="cairnstep-digits"
      />
      <p className="max-w-2xl text-small text-quiet">
        NIST Statistical Reference Datasets. Digits are the log relative error, at most 15. Most of these data cannot be written exactly in
        binary, which limits what any program can reach; so asked for are as many as the reference programs reach.
      </p>
    </div>
  );
}

const columns: readonly Column<Reached>[] = [
  { key: 'set', header: 'Data set', value: ({ set }) => set, isRowHeader: true },
  { key: 'figure', header: 'Figure', value: ({ name }) => name },
  {
    key: 'digits',
    header: 'Digits, at least',
    kind: 'number',
    value: ({ digits }) => digits,
    cell: ({ digits }) => formatNumber(digits, 1),
  },
  { key: 'asked', header: 'Asked for', kind: 'number', value: ({ asked }) => asked },
];
