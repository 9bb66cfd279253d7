'use client';

import { usePathname } from 'next/navigation';

import { Tabs, type Tab } from '@/components/ui/tabs';

/** The tab whose address is the longest beginning of the page's own. */
export function currentTab(pathname: string, tabs: readonly Tab[]): string | undefined {
  return tabs
    .map((tab) => tab.href)
    .filter((href) => pathname === href || pathname.startsWith(`${href}/`))
    .sort((a, b) => b.length - a.length)[0];
}

/** The pages of one notebook. */
export function NotebookTabs({ tabs, label = 'Notebook' }: { tabs: readonly Tab[]; label?: string }) {
  return <Tabs label={label} tabs={tabs} current={currentTab(usePathname(), tabs)} />;
}
