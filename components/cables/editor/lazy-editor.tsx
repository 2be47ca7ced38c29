"use client";

import dynamic from "next/dynamic";
import { Working } from "@/components/ui/working";

/** The editor and the reader of units that comes with it, fetched apart from the page. */
export const LazyEditor = dynamic(
  () => import("@/components/cables/editor/entry-editor").then((file) => file.EntryEditor),
  {
    ssr: false,
    loading: () => <Working label="Opening the editor" />,
  },
);
