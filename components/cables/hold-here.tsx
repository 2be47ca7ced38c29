"use client";

import type { Route } from "next";
import Link from "next/link";
import type { ChangeLook } from "@/components/cables/use-entry-address";
import { Button } from "@/components/ui/button";
import { useKeys } from "@/components/ui/keys";
import { catalogueAddress, mostHeld, readCatalogueAddress } from "@/lib/cables/address";
import type { EntryAsked } from "@/lib/cables/entry-address";
import type { Cable } from "@/lib/cables/schema";

interface Props {
  cable: Cable;
  asked: EntryAsked;
  change: ChangeLook;
}

/** Holds the entry that is open, and leads to what is held with it. */
export function HoldHere({ cable, asked, change }: Props) {
  const { held, lossAtHz } = asked;
  const isHeld = held.includes(cable.id);
  const isFull = !isHeld && held.length >= mostHeld;
  const toggle = () =>
    change(({ held: now }) => {
      if (now.includes(cable.id)) return { held: now.filter((id) => id !== cable.id) };
      return now.length < mostHeld ? { held: [...now, cable.id] } : {};
    });
  useKeys([{ key: "h", does: "hold it to compare, or put it back", run: toggle }]);
  const compare = catalogueAddress({
    ...readCatalogueAddress({}),
    lossAtHz,
    held,
    isCompared: held.length > 1,
  }) as Route;
  return (
    <>
      {held.length > 0 && (
        <Link href={compare} className="link text-label phone:flex phone:min-h-11 phone:items-center">
          {held.length === 1 ? "Find another to compare" : `Compare ${held.length}`}
        </Link>
      )}
      <Button
        aria-pressed={isHeld}
        onClick={toggle}
        refused={isFull && "Four are held already. Put one back in the comparison first."}
      >
        {isHeld ? "Held: put back" : "Hold to compare"}
      </Button>
    </>
  );
}
