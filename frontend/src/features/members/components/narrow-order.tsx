import { Button, Select } from 'antd';
import { useId } from 'react';
import type { MemberSortKey } from '@mantlet/common';
import type { MemberFilter } from '../member-filter.js';
import { memberColumns } from './member-columns.js';

const keys = memberColumns.flatMap((column) => (column.sort ? [{ value: column.sort, label: column.name }] : []));

/** On a phone there are no heads to order by. */
export function NarrowOrder({ filter, setFilter }: { filter: MemberFilter; setFilter: (next: MemberFilter) => void }) {
  const id = useId();
  const down = filter.direction === 'desc';
  return (
    <div className="mt-narrow-order mt-noprint">
      <div className="mt-filter">
        <label htmlFor={id}>Order by</label>
        <Select<MemberSortKey> id={id} value={filter.sort ?? 'mark'} options={keys} onChange={(sort) => setFilter({ ...filter, sort, direction: 'asc' })} style={{ width: '100%' }} />
      </div>
      <Button onClick={() => setFilter({ ...filter, direction: down ? 'asc' : 'desc' })}>{down ? '▾ Greatest first' : '▴ Least first'}</Button>
    </div>
  );
}
