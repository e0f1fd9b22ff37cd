/** The columns of the table of cases: width in pixels, or what is left over. */
import type { CaseOrder } from './filters';

export interface CaseColumn {
  readonly id: string;
  readonly head: string;
  readonly width?: number;
  readonly order?: CaseOrder;
  readonly right?: boolean;
  /** Shown only where the window is at least so wide: the title must not be squeezed. */
  readonly from?: number;
}

export const caseColumns = [
  { id: 'number', head: 'no.', width: 36, order: 'number' },
  { id: 'picture', head: '', width: 46 },
  { id: 'title', head: 'what was seen', order: 'title' },
  { id: 'state', head: 'state', width: 172, order: 'state' },
  { id: 'scanner', head: 'scanner', width: 96 },
  { id: 'coil', head: 'coil', width: 76, from: 1360 },
  { id: 'seen', head: 'kind', width: 104 },
  { id: 'direction', head: 'runs along', width: 76, from: 1360 },
  { id: 'assignee', head: 'with', width: 152 },
  { id: 'age', head: 'age', width: 60, order: 'age', right: true },
] as const satisfies readonly CaseColumn[];

export const columnsFor = (width: number) => caseColumns.filter((column: CaseColumn) => column.from === undefined || width >= column.from);

export type ColumnId = (typeof caseColumns)[number]['id'];
export const columnStyle = (column: CaseColumn) =>
  column.width === undefined
    ? { flex: 1, minWidth: 0 }
    : { width: column.width, ...(column.right ? { alignItems: 'flex-end' as const } : {}) };
