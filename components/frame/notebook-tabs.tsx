'use client';

import { usePathname } from 'next/navigation';

import { Tabs, type Tab } from '@/components/ui/tabs';

export interface NotebookTab extends Tab {
  /** an address whose pages belong to this tab too */
  also?: string;
}

/** The tab whose address, or whose other one, is the longest beginning of the page's own. */
export function currentTab(pathname: string, tabs: readonly NotebookTab[]): string | undefined {
  return tabs
    .flatMap(({ href, also }) =>
      [href, ...(also === undefined ? [] : [also])].map((begin) => ({ href, begin })),
    )
    .filter(({ begin }) => pathname === begin || pathname.startsWith(`${begin}/`))
    .sort((a, b) => b.begin.length - a.begin.length)[0]?.href;
}

/** The pages of one notebook. */
export function NotebookTabs({ tabs, label = 'Notebook' }: { tabs: readonly NotebookTab[]; label?: string }) {
  return <Tabs label={label} tabs={tabs} current={currentTab(usePathname(), tabs)} />;
}
