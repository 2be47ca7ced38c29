import type { Route } from "next";
import Link from "next/link";
import { StateNote } from "@/components/ui/state-mark";

interface Props {
  cableId: string;
  designation: string;
  revision: number;
  because: string;
}

/** A revision that is open and that this person cannot change now. */
export function NotEditable({ cableId, designation, revision, because }: Props) {
  return (
    <div className="max-w-140">
      <h1>
        {designation}, revision {revision}
      </h1>
      <StateNote state="warn" className="mt-3">
        {because}
      </StateNote>
      <p className="mt-3">
        <Link href={`/cables/${encodeURIComponent(cableId)}` as Route} className="link">
          To the entry
        </Link>
      </p>
    </div>
  );
}
