import type { EvidenceRow } from '@cairnstep/statistics';
import type { Column } from '../../ui/table.tsx';
import { RelativeError } from './relative-error.tsx';

export const evidenceColumns: readonly Column<EvidenceRow>[] = [
  { key: 'source', header: 'Outside source', value: ({ source }) => source, isRowHeader: true },
  { key: 'cases', header: 'Cases', kind: 'number', value: ({ cases }) => cases },
  { key: 'figures', header: 'Figures', kind: 'number', value: ({ figures }) => figures },
  {
    key: 'error',
    header: 'Relative error',
    unit: 'at most',
    kind: 'number',
    value: ({ worstRelativeError }) => worstRelativeError,
    cell: ({ worstRelativeError }) => <RelativeError value={worstRelativeError} />,
  },
];
