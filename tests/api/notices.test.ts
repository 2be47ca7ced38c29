import { beforeEach, describe, expect, test } from "vitest";
import { POST as postRead } from "@/app/api/v1/notices/read/route";
import { GET as getNotices } from "@/app/api/v1/notices/route";
import { database } from "@/db/client";
import { notices } from "@/db/schema/notices";
import type { Actor } from "@/lib/auth/actor";
import type { NoticeItem, NoticePage } from "@/lib/notices/schema";
import { withDatabase } from "@/tests/support/database";
import { actor, addPeople, home, other } from "@/tests/support/people";
import { jsonOf, pathsOf, send } from "@/tests/support/requests";

withDatabase(() => addPeople());

const designer = actor("designer");

function tell(who: Actor, count: number, team = home): void {
  for (let i = 0; i < count; i++)
    database()
      .insert(notices)
      .values({
        ...{ id: `${who.personId}-${i}`, teamId: team.id, personId: who.personId, kind: "approved" },
        ...{
          at: new Date(Date.UTC(2026, 2, 1, 12, Math.floor(i / 2))).toISOString(),
          text: `Notice ${i}.`,
          link: "/runs",
        },
      })
      .run();
}

beforeEach(() => {
  database().delete(notices).run();
  tell(designer, 7);
  tell(actor("admin"), 2);
});

const read = async (query = "", as = designer) =>
  jsonOf<NoticePage>(await send(getNotices, "GET", { as, path: `/notices${query}` }));
const mark = (body: unknown, as = designer) => send(postRead, "POST", { as, body });

describe("One's own notices", () => {
  test("come latest first, with how many there are and how many are unread, and nobody else's", async () => {
    const page = await read();
    expect(page).toMatchObject({ total: 7, unread: 7, nextCursor: null });
    expect(page.items.map(({ text }) => text)).toEqual([6, 5, 4, 3, 2, 1, 0].map((i) => `Notice ${i}.`));
    expect(page.items[0]).toEqual({
      ...{ id: `${designer.personId}-6`, at: "2026-03-01T12:03:00.000Z", kind: "approved" },
      ...{ text: "Notice 6.", link: "/runs", isRead: false },
    });
    expect((await read("", actor("auditor"))).items).toEqual([]);
  });

  test("come a page at a time, none twice and none left out, though several share their time", async () => {
    const seen: NoticeItem[] = [];
    let cursor: string | null = "";
    while (cursor !== null) {
      const page: NoticePage = await read(`?limit=2${cursor && `&cursor=${cursor}`}`);
      seen.push(...page.items);
      cursor = page.nextCursor;
    }
    expect(new Set(seen.map(({ id }) => id)).size).toBe(7);
    expect(seen).toHaveLength(7);
  });

  test("of another team of the same person are not among them", async () => {
    database()
      .insert(notices)
      .values({
        ...{ id: "elsewhere", teamId: other.id, personId: designer.personId, at: "2026-04-01T00:00:00.000Z" },
        ...{ kind: "approved", text: "Elsewhere.", link: "/runs" },
      })
      .run();
    expect(await read()).toMatchObject({ total: 7, unread: 7 });
    await mark({ all: true });
    expect(
      database()
        .select()
        .from(notices)
        .all()
        .find(({ id }) => id === "elsewhere")?.readAt,
    ).toBeNull();
  });
});

describe("Reading", () => {
  test("some marks those, and again changes nothing", async () => {
    const ids = [0, 3].map((i) => `${designer.personId}-${i}`);
    expect(await jsonOf(await mark({ ids }))).toEqual({ unread: 5 });
    const readAt = () =>
      database()
        .select()
        .from(notices)
        .all()
        .map((row) => row.readAt);
    const before = readAt();
    expect(await jsonOf(await mark({ ids }))).toEqual({ unread: 5 });
    expect(readAt()).toEqual(before);
    expect((await read("?unread=true")).items.map(({ text }) => text)).toEqual(
      [6, 5, 4, 2, 1].map((i) => `Notice ${i}.`),
    );
    expect(await read("?unread=true")).toMatchObject({ total: 5, unread: 5 });
  });

  test("all marks all of one's own, and nobody else's", async () => {
    expect(await jsonOf(await mark({ all: true }))).toEqual({ unread: 0 });
    expect((await read()).items.every(({ isRead }) => isRead)).toBe(true);
    expect((await read("", actor("admin"))).unread).toBe(2);
  });

  test("all up to a time leaves what came after it", async () => {
    expect(await jsonOf(await mark({ all: true, upTo: "2026-03-01T12:01:00Z" }))).toEqual({ unread: 3 });
  });

  test("another's notice, or one that is none, changes nothing", async () => {
    expect(await jsonOf(await mark({ ids: [`${actor("admin").personId}-0`, "nothing"] }))).toEqual({ unread: 7 });
    expect((await read("", actor("admin"))).unread).toBe(2);
  });

  test.each([
    ["nothing", {}, ["ids"]],
    ["both", { ids: ["a"], all: true }, [""]],
    ["no ids", { ids: [] }, ["ids"]],
    ["too many ids", { ids: Array.from({ length: 201 }, (_, i) => `${i}`) }, ["ids"]],
    ["all: false", { all: false }, ["all"]],
    ["a time that is none", { all: true, upTo: "yesterday" }, ["upTo"]],
  ])("%s is refused where it is wrong", async (_, body, paths) => {
    const answer = await mark(body);
    expect(answer.status).toBe(422);
    expect(await pathsOf(answer)).toEqual(paths);
  });
});
