import { Tabs as RadixTabs } from 'radix-ui';
import type { ReactNode } from 'react';

export interface Tab {
  id: string;
  label: ReactNode;
  content: ReactNode;
}

export interface TabsProps {
  /** Names the row of tabs for readers. */
  label: string;
  tabs: readonly Tab[];
  value?: string;
  defaultValue?: string;
  onValueChange?: (id: string) => void;
}

/** One of several sheets at a time. Arrow keys move along the row, which scrolls sideways on a phone. */
export function Tabs({ label, tabs, value, defaultValue, onValueChange }: TabsProps) {
  return (
    <RadixTabs.Root
      onValueChange={onValueChange}
      {...(value === undefined ? { defaultValue: defaultValue ?? tabs[0]?.id } : { value })}
    >
      <RadixTabs.List aria-label={label} className="flex gap-6 overflow-x-auto border-b border-hairline print:hidden">
        {tabs.map((tab) => (
          <RadixTabs.Trigger
            key={tab.id}
            value={tab.id}
            className="min-h-thumb flex-none border-b-2 border-transparent px-0.5 text-lead-grey -outline-offset-2 hover:text-soot data-[state=active]:border-brass data-[state=active]:font-semibold data-[state=active]:text-soot"
          >
            {tab.label}
          </RadixTabs.Trigger>
        ))}
      </RadixTabs.List>
      {tabs.map((tab) => (
        <RadixTabs.Content key={tab.id} value={tab.id} className="pt-4">
          {tab.content}
        </RadixTabs.Content>
      ))}
    </RadixTabs.Root>
  );
}
