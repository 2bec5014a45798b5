'use client';

import type { ReactNode } from 'react';
import { Tabs as Parts } from 'radix-ui';

interface TabsProps {
  label: string;
  tabs: { value: string; name: ReactNode; content: ReactNode }[];
  defaultValue?: string;
  value?: string;
  onValueChange?: (value: string) => void;
}

/** For views of one thing in the member's and moderator's pages; what a reader must find stands open on its page. */
export function Tabs({ label, tabs, defaultValue = tabs[0]?.value, value, onValueChange }: TabsProps) {
  return (
    <Parts.Root defaultValue={defaultValue} value={value} onValueChange={onValueChange}>
      <Parts.List aria-label={label} className="flex gap-6 overflow-x-auto border-b border-rule">
        {tabs.map((tab) => (
          <Parts.Trigger
            key={tab.value}
            value={tab.value}
            className="-mb-px target border-b-3 border-transparent whitespace-nowrap text-muted hover:text-ink data-[state=active]:border-lichen data-[state=active]:font-semibold data-[state=active]:text-ink"
          >
            {tab.name}
          </Parts.Trigger>
        ))}
      </Parts.List>
      {tabs.map((tab) => (
        <Parts.Content key={tab.value} value={tab.value} className="pt-5">
          {tab.content}
        </Parts.Content>
      ))}
    </Parts.Root>
  );
}
