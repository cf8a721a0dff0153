import { memo } from 'react';
import { RadioGroup } from '../../ui/radio-group.tsx';
import type { Act } from './entry.ts';
import type { EntryOrder } from './places.ts';

/** Where typing goes on after a cell. */
export const OrderChoice = memo(function OrderChoice({ order, act }: { readonly order: EntryOrder; readonly act: (act: Act) => void }) {
  return (
    <div className="not-printed">
      <RadioGroup
        id="entry-order"
        label="Typing goes on"
        inline
        value={order}
        onChange={(value) => act({ act: 'choose-order', order: value === 'across' ? 'across' : 'down' })}
        options={[
          { value: 'down', label: 'down a column' },
          { value: 'across', label: 'across a row' },
        ]}
      />
    </div>
  );
});
