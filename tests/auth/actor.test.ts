import { eq } from "drizzle-orm";
import { expect, test } from "vitest";
import { database } from "@/db/client";
import { tokens } from "@/db/schema/team";
import { requestActor } from "@/lib/auth/actor";
import { hashOfSecret } from "@/lib/auth/service";
import { withDatabase } from "@/tests/support/database";
import { actor, addPeople, home } from "@/tests/support/people";
import { cookieOf } from "@/tests/support/requests";

const token = "a-random-token-of-some-length";

withDatabase(async () => {
  await addPeople();
  const { personId, teamId } = actor("librarian");
  const row = { id: "t1", teamId, personId, name: "nightly export", hash: hashOfSecret(token), createdAt: "2026" };
  database().insert(tokens).values(row).run();
});

const asking = (headers: Record<string, string>) => requestActor(new Request("http://ropewalk.test/", { headers }));
const isUnknown = expect.objectContaining({ code: "unauthenticated", status: 401 });

test("A cookie tells who asks", async () => {
  expect(await asking({ cookie: await cookieOf(actor("auditor")) })).toMatchObject({
    ...actor("auditor"),
    teamId: home.id,
  });
});

test("A token tells whom it acts for, and has no session", async () => {
  const found = await asking({ authorization: `Bearer ${token}` });
  expect(found).toEqual(actor("librarian"));
  expect(await asking({ authorization: `bearer  ${token}` })).toEqual(found);
});

test("Nobody asks without either", async () => {
  await expect(asking({})).rejects.toEqual(isUnknown);
});

test("A token that is not good is not made up for by a good cookie", async () => {
  const cookie = await cookieOf(actor("auditor"));
  await expect(asking({ cookie, authorization: "Bearer wrong" })).rejects.toEqual(isUnknown);
});

test("A proxy's own password in the header says nothing about who asks", async () => {
  const cookie = await cookieOf(actor("auditor"));
  expect(await asking({ cookie, authorization: "Basic dXNlcjpwYXNz" })).toMatchObject(actor("auditor"));
});

test("A token that has expired or been revoked is good for nothing", async () => {
  const set = (values: Partial<typeof tokens.$inferInsert>) =>
    database().update(tokens).set(values).where(eq(tokens.id, "t1")).run();
  set({ expiresAtMs: Date.now() + 60_000 });
  await expect(asking({ authorization: `Bearer ${token}` })).resolves.toBeDefined();
  set({ expiresAtMs: Date.now() - 1 });
  await expect(asking({ authorization: `Bearer ${token}` })).rejects.toEqual(isUnknown);
  set({ expiresAtMs: null, revokedAt: "2026-02-01" });
  await expect(asking({ authorization: `Bearer ${token}` })).rejects.toEqual(isUnknown);
});

test("The stored hash of a token is not itself a token", async () => {
  const row = database().select().from(tokens).get();
  await expect(asking({ authorization: `Bearer ${row?.hash}` })).rejects.toEqual(isUnknown);
});
