import { beforeAll, describe, expect, test, vi } from "vitest";
import { GET as getLetters } from "@/app/api/v1/team/letters/route";
import { database } from "@/db/client";
import { letters } from "@/db/schema/notices";
import type { LetterPage } from "@/lib/mail/schema";
import { withDatabase } from "@/tests/support/database";
import { actor, addPeople, home, other } from "@/tests/support/people";
import { jsonOf, send } from "@/tests/support/requests";

withDatabase(() => addPeople());

beforeAll(() => {
  const states = ["waiting", "sent", "givenUp", "waiting"] as const;
  for (const [i, state] of states.entries())
    database()
      .insert(letters)
      .values({
        ...{ id: `letter-${i}`, teamId: i === 3 ? other.id : home.id, toAddress: "ines@skerry-light.example" },
        ...{ subject: `Letter ${i}`, body: "Read this.\n", state, tries: 1, error: i === 2 ? "550 no such box" : null },
        ...{ writtenAt: `2026-03-01T12:0${i}:00.000Z`, nextTryAt: "2026-03-01T13:00:00.000Z" },
      })
      .run();
});

const read = async (query = "", as = actor("admin")) =>
  jsonOf<LetterPage>(await send(getLetters, "GET", { as, path: `/team/letters${query}` }));

describe("The letters of a team", () => {
  test("come latest first, with their state and what the mail server said, and no other team's", async () => {
    const page = await read();
    expect(page).toMatchObject({ total: 3, nextCursor: null, hasMailServer: false });
    expect(page.items.map(({ id, state, error }) => [id, state, error])).toEqual([
      ["letter-2", "givenUp", "550 no such box"],
      ["letter-1", "sent", null],
      ["letter-0", "waiting", null],
    ]);
    expect(page.items.every((letter) => !("teamId" in letter))).toBe(true);
  });

  test("are found by state, a page at a time", async () => {
    expect((await read("?state=sent")).items.map(({ id }) => id)).toEqual(["letter-1"]);
    const first = await read("?limit=2");
    const second = await read(`?limit=2&cursor=${first.nextCursor}`);
    expect([...first.items, ...second.items].map(({ id }) => id)).toEqual(["letter-2", "letter-1", "letter-0"]);
    expect((await send(getLetters, "GET", { as: actor("admin"), path: "/?state=lost" })).status).toBe(422);
  });

  test("say when they are tried again only where a mail server is set", async () => {
    expect((await read("?state=waiting")).items[0]?.nextTryAt).toBeNull();
    vi.stubEnv("SMTP_URL", "smtp://127.0.0.1:2525");
    vi.stubEnv("MAIL_FROM", "ropewalk@skerry-light.example");
    expect(await read("?state=waiting")).toMatchObject({
      hasMailServer: true,
      items: [{ nextTryAt: "2026-03-01T13:00:00.000Z" }],
    });
    vi.unstubAllEnvs();
  });
});
