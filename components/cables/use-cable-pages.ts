"use client";

import { useInfiniteQuery } from "@tanstack/react-query";
import { useEffect, useState } from "react";
import type { CablePage } from "@/lib/cables/query";
import { nextRequest } from "@/lib/cables/request";
import { call } from "@/lib/http/call";

/** A page that came with the document, and what had been asked for it. */
export interface FirstPage {
  request: string;
  page: CablePage;
}

const restMs = 90;

/** A text once it has rested for a moment. */
function useRested(text: string): string {
  const [rested, setRested] = useState(text);
  useEffect(() => {
    const timer = setTimeout(() => setRested(text), restMs);
    return () => clearTimeout(timer);
  }, [text]);
  return rested;
}

/** The pages of a search as far as they have been scrolled to. */
export function useCablePages(request: string, first: FirstPage) {
  const rested = useRested(request);
  const query = useInfiniteQuery({
    queryKey: ["cables", "catalogue", rested],
    queryFn: ({ pageParam, signal }) =>
      call<CablePage>(pageParam === null ? rested : nextRequest(rested, pageParam), { signal }),
    initialPageParam: null as string | null,
    getNextPageParam: (page) => page.nextCursor,
    initialData: rested === first.request ? { pages: [first.page], pageParams: [null] } : undefined,
    placeholderData: (before) => before,
    // Comparing thousands of rows with themselves at each page would be felt.
    structuralSharing: false,
  });
  // An answer that fails leaves what was there before: it is said to be old, but it is not taken away.
  const [last, setLast] = useState(query.data);
  if (query.data !== undefined && query.data !== last) setLast(query.data);
  const isOld = query.data === undefined || query.isPlaceholderData;
  return { ...query, data: query.data ?? last, isBehind: isOld || rested !== request };
}
