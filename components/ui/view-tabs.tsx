import type { Route } from "next";
import Link from "next/link";
import type { ReactNode } from "react";

export interface TabItem {
  href: Route;
  label: string;
  /** what waits there; nothing is shown of none */
  count?: number;
}

/** How much waits at a place, after its name. */
export function TabCount({ count }: Pick<TabItem, "count">) {
  if (!count) return null;
  return (
    <span className="figures ml-1.5 text-copper">
      {count}
      <span className="sr-only"> waiting</span>
    </span>
  );
}

interface ViewTabsProps {
  items: TabItem[];
  /** href of the view that is open */
  current: string;
  /** names the group for screen readers */
  name: string;
  /** stands at the right end: "saved 2 min ago", buttons */
  aside?: ReactNode;
  /** on a phone the tabs stand at the thumb, in place of the main places */
  isFootOnPhone?: boolean;
}

/** The views of one thing. */
export function ViewTabs({ items, current, name, aside, isFootOnPhone = true }: ViewTabsProps) {
  return (
    <div className="flex flex-wrap items-start justify-between gap-x-4 border-b border-rule phone:border-0">
      <nav aria-label={name} className={isFootOnPhone ? "phone:hidden" : ""}>
        <ul className="flex flex-wrap gap-x-6 gap-y-1">
          {items.map((item) => {
            const isCurrent = item.href === current;
            return (
              <li key={item.href}>
                <Link
                  href={item.href}
                  aria-current={isCurrent ? "page" : undefined}
                  className={`block border-b-[3px] pb-1.25 hover:text-ink phone:flex phone:min-h-11 phone:items-end ${isCurrent ? "border-copper font-[640] text-ink" : "border-transparent font-[480] text-ink-2"}`}
                >
                  {item.label}
                </Link>
              </li>
            );
          })}
        </ul>
      </nav>
      {aside && (
        <div
          className={`-mt-1.5 flex flex-wrap items-center gap-2.5 pb-1 text-note text-ink-3 ${isFootOnPhone ? "" : "phone:mt-3"}`}
        >
          {aside}
        </div>
      )}
      {isFootOnPhone && <FootTabs items={items} current={current} name={name} />}
    </div>
  );
}

interface FootTabsProps {
  items: TabItem[];
  current: string;
  name: string;
}

/** Tabs along the foot of a phone; nothing on wider screens. Pages leave room for it (`pb-14` on a phone). */
export function FootTabs({ items, current, name }: FootTabsProps) {
  return (
    <nav
      aria-label={name}
      className="fixed inset-x-0 bottom-0 z-20 hidden border-t border-rule bg-paper pb-[env(safe-area-inset-bottom)] phone:block print:hidden"
    >
      <ul className="flex h-13.5 text-control">
        {items.map((item) => {
          const isCurrent = item.href === current;
          return (
            <li key={item.href} className="min-w-0 flex-1">
              <Link
                href={item.href}
                aria-current={isCurrent ? "page" : undefined}
                className={`flex h-full items-center justify-center border-t-[3px] ${isCurrent ? "border-copper font-[640] text-ink" : "border-transparent font-[480] text-ink-2"}`}
              >
                {item.label}
                <TabCount count={item.count} />
              </Link>
            </li>
          );
        })}
      </ul>
    </nav>
  );
}
