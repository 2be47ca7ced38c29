/** What the demo's people have been told. No letters: their addresses lead nowhere. */
import { database } from "@/db/client";
import { notices } from "@/db/schema/notices";
import type { NoticeKind } from "@/lib/notices/service";
import data from "@/seeds/data/notices.json";
import team from "@/seeds/data/team.json";

/** Adds the notices that are missing. */
export function seedNotices(): void {
  const rows = data.notices.flatMap(({ id, at, kind, to, text, link }) =>
    to.map((personId) => ({
      ...{ id: `${id}-${personId}`, teamId: team.team.id, personId, at },
      ...{ kind: kind as NoticeKind, text, link },
    })),
  );
  database().insert(notices).values(rows).onConflictDoNothing().run();
}
