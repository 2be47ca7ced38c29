import type { Route } from "next";
import Link from "next/link";
import type { ReactNode } from "react";
import { Lay } from "@/components/ui/lay";
import { Mark, Wordmark } from "@/components/ui/mark";
import { MemberMenu, type BarMember } from "@/components/ui/member-menu";
import { FootTabs, TabCount, type TabItem } from "@/components/ui/view-tabs";

interface BarProps {
  places: TabItem[];
  /** href of the place that is open */
  current: string;
  home: Route;
  teamName: string;
  member: BarMember;
  /** form action that signs out */
  signOut: () => void | Promise<void>;
  /** the find field */
  find?: ReactNode;
  /** stands before the team's name, on a phone too */
  beside?: ReactNode;
  /** what stands in the bar of a phone in place of the name; the page's own title */
  title?: string;
  /** on a phone an arrow back stands in place of the mark */
  back?: Route;
  /** leave the foot of a phone free for the views of one thing */
  hasOwnFoot?: boolean;
}

function PhoneName({ title, back, home }: Pick<BarProps, "title" | "back" | "home">) {
  return (
    <div className="hidden min-w-0 flex-1 items-center gap-3 phone:flex">
      {back ? (
        <Link href={back} aria-label="Back" className="-ml-3 flex h-11 w-11 items-center justify-center">
          <svg width="12" height="18" aria-hidden="true">
            <path d="M10 2L3 9l7 7" fill="none" stroke="var(--ink)" strokeWidth="2" />
          </svg>
        </Link>
      ) : (
        <Link href={home} aria-label="Ropewalk" className="flex h-11 items-center">
          <Mark height={18} />
        </Link>
      )}
      <span className="flared truncate text-lead">{title ?? "Ropewalk"}</span>
    </div>
  );
}

function Places({ places, current }: Pick<BarProps, "places" | "current">) {
  return (
    <nav aria-label="Places" className="ml-3.5 phone:hidden">
      <ul className="flex h-12.5 gap-5.5">
        {places.map(({ href, label, count }) => (
          <li key={href} className="h-full">
            <Link
              href={href}
              aria-current={href === current ? "page" : undefined}
              className={`relative flex h-full items-center hover:text-ink ${
                href === current
                  ? "font-[640] text-ink after:absolute after:inset-x-0 after:bottom-0.75 after:h-0.75 after:bg-copper"
                  : "font-medium text-ink-2"
              }`}
            >
              {label}
              <TabCount count={count} />
            </Link>
          </li>
        ))}
      </ul>
    </nav>
  );
}

/** The bar at the head of every page, the lay under it, and on a phone the places at its foot. */
export function Bar({
  places,
  current,
  home,
  teamName,
  member,
  signOut,
  find,
  beside,
  title,
  back,
  hasOwnFoot = false,
}: BarProps) {
  return (
    <header className="print:hidden">
      <a href="#main" className="sr-only focus:not-sr-only focus:absolute focus:z-30 focus:bg-paper focus:p-2">
        Skip to the page
      </a>
      <div className="page-margin flex h-12.5 items-center gap-6.5 phone:h-13 phone:gap-3">
        <Link href={home} className="text-ink phone:hidden">
          <Wordmark />
        </Link>
        <PhoneName title={title} back={back} home={home} />
        <Places places={places} current={current} />
        <div className="flex flex-1 items-center justify-end gap-6.5 phone:flex-none phone:gap-3">
          {find}
          {beside}
          <span className="text-label whitespace-nowrap text-ink-2 folded:hidden">{teamName}</span>
          <MemberMenu member={member} teamName={teamName} signOut={signOut} />
        </div>
      </div>
      <Lay />
      {!hasOwnFoot && <FootTabs items={places} current={current} name="Places" />}
    </header>
  );
}
