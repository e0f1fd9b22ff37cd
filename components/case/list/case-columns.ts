/** The columns of the table of cases: width in pixels, or what is left over. */
import type { CaseOrder } from './filters';

export interface CaseColumn {
  readonly id: string;
  readonly head: string;
  readonly width?: number;
  readonly order?: CaseOrder;
  readonly right?: boolean;
}

export const caseColumns = [
  { id: 'number', head: 'no.', width: 44, order: 'number' },
  { id: 'picture', head: '', width: 46 },
  { id: 'title', head: 'what was seen', order: 'title' },
  { id: 'state', head: 'state', width: 180, order: 'state' },
  { id: 'scanner', head: 'scanner', width: 108 },
  { id: 'coil', head: 'coil', width: 92 },
  { id: 'seen', head: 'kind', width: 112 },
  { id: 'direction', head: 'runs along', width: 116 },
  { id: 'assignee', head: 'with', width: 132 },
  { id: 'age', head: 'age', width: 72, order: 'age', right: true },
] as const satisfies readonly CaseColumn[];

export type ColumnId = (typeof caseColumns)[number]['id'];
export const columnStyle = (column: CaseColumn) =>
  column.width === undefined
    ? { flex: 1, minWidth: 0 }
    : { width: column.width, ...(column.right ? { alignItems: 'flex-end' as const } : {}) };
