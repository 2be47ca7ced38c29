"use client";

import { useQuery } from "@tanstack/react-query";
import type { Route } from "next";
import Link from "next/link";
import { call } from "@/lib/http/call";
import type { NoticePage } from "@/lib/notices/schema";

const mostShown = 99;

/** The way to one's notices, in words, and how many have not been read. It looks again every minute. */
export function NoticesLink({ isCurrent }: { isCurrent: boolean }) {
  const { data } = useQuery({
    queryKey: ["notices", "unread"],
    queryFn: ({ signal }) => call<Pick<NoticePage, "unread">>("/notices?limit=1", { signal }),
    refetchInterval: 60_000,
  });
  const unread = data?.unread ?? 0;
  const shown = unread > mostShown ? `${mostShown}+` : `${unread}`;
  return (
    <Link
      href={"/notices" as Route}
      aria-label={unread > 0 ? `Notices ${shown} unread` : undefined}
      aria-current={isCurrent ? "page" : undefined}
      className={`flex min-h-6 items-center gap-1.5 text-label hover:text-ink phone:min-h-11 ${isCurrent ? "font-[640] text-ink" : "text-ink-2"}`}
    >
      Notices
      {unread > 0 && <span className="figures rounded-full bg-copper px-1.5 font-[640] text-on-copper">{shown}</span>}
    </Link>
  );
}
