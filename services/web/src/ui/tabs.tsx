import type { ReactNode } from 'react';
import { Tab, TabList, TabPanel, Tabs as AriaTabs } from 'react-aria-components/Tabs';
import { useAddressParam } from '../lib/address-state.ts';

export interface TabItem {
  readonly key: string;
  readonly label: string;
  readonly content: ReactNode;
}

/** Views of one thing; which one is open stands in the address under `name`. */
export function Tabs({
  label,
  name = 'tab',
  items,
}: {
  readonly label: string;
  readonly name?: string;
  readonly items: readonly TabItem[];
}) {
  const [chosen, choose] = useAddressParam(name);
  const open = items.find(({ key }) => key === chosen) ?? items[0];
  return (
    <AriaTabs
      {...(open !== undefined && { selectedKey: open.key })}
      onSelectionChange={(key) => choose(key === items[0]?.key ? null : String(key))}
    >
      <TabList aria-label={label} items={items} className="flex flex-wrap gap-x-6 border-b border-hairline">
        {(item) => (
          <Tab
            id={item.key}
            className="-mb-px min-h-10 cursor-pointer border-b-3 border-transparent py-2 text-quiet data-[focus-visible]:outline-2 data-[focus-visible]:outline-lake data-[hovered]:text-ink data-[selected]:border-lichen data-[selected]:font-semibold data-[selected]:text-ink"
          >
            {item.label}
          </Tab>
        )}
      </TabList>
      {items.map((item) => (
        <TabPanel key={item.key} id={item.key} className="pt-6 data-[focus-visible]:outline-2 data-[focus-visible]:outline-lake">
          {item.content}
        </TabPanel>
      ))}
    </AriaTabs>
  );
}
