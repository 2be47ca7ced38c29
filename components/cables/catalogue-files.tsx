import type { Route } from "next";
import Link from "next/link";
import { useRef } from "react";
import { buttonClass } from "@/components/ui/button";

export interface FilesAllowed {
  canExport: boolean;
  canImport: boolean;
}

const item = "flex min-h-7.5 items-center rounded px-2.5 whitespace-nowrap hover:bg-hemp phone:min-h-11";

/** The catalogue as files: taken out, brought in. The browser's own disclosure, so that it opens without a script. */
export function CatalogueFiles({ canExport, canImport }: FilesAllowed) {
  const menu = useRef<HTMLDetailsElement>(null);
  if (!canExport && !canImport) return null;
  const close = () => menu.current?.removeAttribute("open");
  return (
    <details
      ref={menu}
      className="relative"
      onKeyDown={(event) => {
        if (event.key !== "Escape" || !menu.current?.open) return;
        event.stopPropagation();
        close();
        menu.current.querySelector("summary")?.focus();
      }}
      onBlur={(event) => {
        if (!event.currentTarget.contains(event.relatedTarget)) close();
      }}
    >
      <summary className={`${buttonClass("plain")} cursor-pointer list-none [&::-webkit-details-marker]:hidden`}>
        {canImport ? "Take out, bring in" : "Take out"}
      </summary>
      <ul className="absolute right-0 z-10 mt-1 rounded border border-ink bg-paper p-1 text-label phone:right-auto phone:left-0">
        {canExport && (
          <>
            <li>
              <a href="/api/v1/cables/export?format=csv" download className={item} onClick={close}>
                All cables as CSV
              </a>
            </li>
            <li>
              <a href="/api/v1/cables/export?format=json" download className={item} onClick={close}>
                All cables as JSON
              </a>
            </li>
          </>
        )}
        {canImport && (
          <li>
            <Link href={"/cables/import" as Route} className={item}>
              Bring in cables
            </Link>
          </li>
        )}
      </ul>
    </details>
  );
}
