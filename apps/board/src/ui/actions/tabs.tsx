import type { ReactNode } from 'react';
import { Tab, TabList, TabPanel, Tabs as AriaTabs } from 'react-aria-components/Tabs';

interface TabsProps {
  readonly label: string;
  readonly tabs: readonly { readonly key: string; readonly label: string; readonly content: ReactNode }[];
  readonly selectedKey?: string | undefined;
  readonly onChange?: ((key: string) => void) | undefined;
}

/** Tabs inside a page, chosen with Enter after moving with the arrow keys. */
export function Tabs({ label, tabs, selectedKey, onChange }: TabsProps) {
  return (
    <AriaTabs
      keyboardActivation="manual"
      {...(selectedKey === undefined ? {} : { selectedKey })}
      {...(onChange === undefined ? {} : { onSelectionChange: (key: string | number) => onChange(String(key)) })}
    >
      <TabList aria-label={label} className="border-hair -mx-2 flex gap-1 overflow-x-auto border-b">
        {tabs.map((tab) => (
          <Tab
            key={tab.key}
            id={tab.key}
            className="text-body text-ink-2 data-selected:text-ink data-selected:before:bg-indigo relative flex min-h-10 forced-color-adjust-none cursor-pointer items-center px-2 whitespace-nowrap before:absolute before:inset-x-2 before:bottom-0 before:h-1 focus-visible:-outline-offset-3 data-selected:font-semibold"
          >
            {tab.label}
          </Tab>
        ))}
      </TabList>
      {tabs.map((tab) => (
        <TabPanel key={tab.key} id={tab.key} className="pt-4">
          {tab.content}
        </TabPanel>
      ))}
    </AriaTabs>
  );
}
