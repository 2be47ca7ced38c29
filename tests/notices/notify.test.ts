import { eq } from "drizzle-orm";
import { expect, test } from "vitest";
import { database } from "@/db/client";
import { letters, notices } from "@/db/schema/notices";
import { notify } from "@/lib/notices/service";
import { withDatabase } from "@/tests/support/database";
import { actor, addPeople, other } from "@/tests/support/people";

withDatabase(() => addPeople());

const told = { kind: "approved", text: "C50-F10, revision 2, was approved.", link: "/cables/c50-f10" } as const;

test("Members are told once each, by notice and by letter, and never the one who did it", () => {
  const librarian = actor("librarian");
  const designer = actor("designer");
  notify(librarian, [designer.personId, designer.personId, librarian.personId], told);
  const rows = database().select().from(notices).all();
  expect(rows).toMatchObject([{ personId: designer.personId, text: told.text, link: told.link, readAt: null }]);
  const [letter, ...more] = database().select().from(letters).all();
  expect(more).toEqual([]);
  expect(letter?.body).toContain("/cables/c50-f10");
  expect(letter?.state).toBe("waiting");
});

test("Nobody outside the team is told", () => {
  database().delete(notices).run();
  notify(actor("librarian"), [actor("designer", other).personId], told);
  expect(database().select().from(notices).where(eq(notices.text, told.text)).all()).toEqual([]);
});
