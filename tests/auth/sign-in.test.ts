import { eq } from "drizzle-orm";
import { afterEach, beforeEach, describe, expect, test, vi } from "vitest";
import { database } from "@/db/client";
import { members, people, sessions, signInAttempts } from "@/db/schema/team";
import { mostPerAccount, mostPerAddress } from "@/lib/auth/attempts/service";
import { clearedCookie, cookieName, sealedCookie, sentCookie, unsealedKey } from "@/lib/auth/cookie";
import { changePassword, findSessionActor, hashOfSecret, signIn, signOut } from "@/lib/auth/service";
import type { AppError } from "@/lib/http/errors";
import { withDatabase } from "@/tests/support/database";
import { actor, addPeople, home, password } from "@/tests/support/people";
import { insertSession } from "@/tests/support/sessions";

withDatabase(addPeople);

beforeEach(() => {
  database().delete(signInAttempts).run();
});
afterEach(() => {
  vi.useRealTimers();
});

const email = actor("designer").email;
const refusal = (promise: Promise<unknown>): Promise<AppError> =>
  promise.then(
    () => Promise.reject(new Error("it was not refused")),
    (error: AppError) => error,
  );

describe("Signing in", () => {
  test("opens a session that tells who asks, in which team, as what", async () => {
    const { key } = await signIn({ email, password }, "10.0.0.1");
    expect(findSessionActor(key)).toEqual({ ...actor("designer"), sessionId: hashOfSecret(key) });
  });

  test("keeps no key that would sign anyone in, only its hash", async () => {
    const { key } = await signIn({ email, password }, "10.0.0.1");
    expect(JSON.stringify(database().select().from(sessions).all())).not.toContain(key);
  });

  test("answers one and the same for a wrong password and an unknown address", async () => {
    const wrong = await refusal(signIn({ email, password: "not this one" }, "10.0.0.1"));
    const unknown = await refusal(signIn({ email: "nobody@skerry-light.example", password }, "10.0.0.1"));
    expect(wrong).toMatchObject({ code: "unauthenticated", status: 401 });
    expect({ ...unknown, message: unknown.message }).toEqual({ ...wrong, message: wrong.message });
  });

  test("does the work of checking a password for an unknown address too", async () => {
    const timed = async (address: string) => {
      const begin = performance.now();
      await refusal(signIn({ email: address, password: "not this one" }, "10.0.0.1"));
      return performance.now() - begin;
    };
    const quickest = async (address: string) =>
      Math.min(await timed(address), await timed(address), await timed(address));
    // Hashing dominates: without it an answer takes well under a tenth of the time.
    expect(await quickest("nobody@skerry-light.example")).toBeGreaterThan((await quickest(email)) / 4);
  });

  test("is refused to somebody who is in no team", async () => {
    const person = { id: "left", name: "Left", email: "left@skerry-light.example", createdAt: "2026" };
    const passwordHash = database().select().from(people).get()?.passwordHash ?? "";
    database()
      .insert(people)
      .values({ ...person, passwordHash })
      .run();
    expect(await refusal(signIn({ email: person.email, password }, "10.0.0.1"))).toMatchObject({
      code: "unauthenticated",
    });
  });
});

describe("Guessing", () => {
  test("is stopped per account, from wherever it comes, whether or not the account exists", async () => {
    for (const address of [email, "nobody@skerry-light.example"]) {
      for (let i = 0; i < mostPerAccount; i++)
        expect((await refusal(signIn({ email: address, password: "guess" }, `10.0.1.${i}`))).code).toBe(
          "unauthenticated",
        );
      const stopped = await refusal(signIn({ email: address, password }, "10.0.2.1"));
      expect(stopped).toMatchObject({ code: "too_many_requests", status: 429 });
      expect(Number(stopped.extra.headers?.["Retry-After"])).toBeGreaterThan(800);
    }
  });

  test("is stopped per network address, whatever the accounts", async () => {
    const rows = Array.from({ length: mostPerAddress }, (_, i) => ({
      addressHash: hashOfSecret("10.0.3.1"),
      accountHash: `account ${i}`,
      atMs: Date.now() - i,
    }));
    database().insert(signInAttempts).values(rows).run();
    expect(await refusal(signIn({ email, password }, "10.0.3.1"))).toMatchObject({ code: "too_many_requests" });
    await expect(signIn({ email, password }, "10.0.3.2")).resolves.toBeDefined();
  });

  test("cannot slip through many at once", async () => {
    const attempts = Array.from({ length: 3 * mostPerAccount }, () =>
      refusal(signIn({ email, password: "guess" }, "10.0.4.1")),
    );
    const codes = (await Promise.all(attempts)).map(({ code }) => code);
    expect(codes.filter((code) => code === "unauthenticated")).toHaveLength(mostPerAccount);
  });

  test("is forgotten after a quarter of an hour", async () => {
    for (let i = 0; i < mostPerAccount; i++) await refusal(signIn({ email, password: "guess" }, "10.0.5.1"));
    vi.useFakeTimers({ toFake: ["Date"], now: Date.now() + 15 * 60 * 1000 + 1 });
    await expect(signIn({ email, password }, "10.0.5.1")).resolves.toBeDefined();
  });

  test("is forgotten when the right password is given: people mistype", async () => {
    for (let round = 0; round < 3; round++) {
      for (let i = 1; i < mostPerAccount; i++) await refusal(signIn({ email, password: "guess" }, "10.0.6.1"));
      await signIn({ email, password }, "10.0.6.1");
    }
    expect(database().select().from(signInAttempts).all()).toEqual([]);
  });
});

describe("A session ends", () => {
  test("when it is signed out, and only that one", async () => {
    const first = await signIn({ email, password }, "10.0.0.1");
    const second = await signIn({ email, password }, "10.0.0.1");
    signOut(first.actor);
    expect(findSessionActor(first.key)).toBeUndefined();
    expect(findSessionActor(second.key)).toBeDefined();
  });

  test("when its time is over", () => {
    expect(findSessionActor(insertSession(actor("auditor"), Date.now() - 1))).toBeUndefined();
  });

  test("when the person leaves the team", () => {
    const key = insertSession(actor("installer"));
    database()
      .delete(members)
      .where(eq(members.personId, actor("installer").personId))
      .run();
    expect(findSessionActor(key)).toBeUndefined();
    database()
      .insert(members)
      .values({ teamId: home.id, personId: actor("installer").personId, role: "installer" })
      .run();
  });

  test("in every other browser when the password changes", async () => {
    const here = await signIn({ email: actor("admin").email, password }, "10.0.0.1");
    const elsewhere = await signIn({ email: actor("admin").email, password }, "10.0.0.1");
    await changePassword(here.actor, { current: password, next: "four red buoys" }, "10.0.0.1");
    expect(findSessionActor(here.key)).toBeDefined();
    expect(findSessionActor(elsewhere.key)).toBeUndefined();
    await refusal(signIn({ email: actor("admin").email, password }, "10.0.0.1"));
    await expect(
      signIn({ email: actor("admin").email, password: "four red buoys" }, "10.0.0.1"),
    ).resolves.toBeDefined();
  });
});

describe("Changing the password", () => {
  test("is refused at `current` when that is wrong, and guessing it is limited like signing in", async () => {
    const { actor: librarian } = await signIn({ email: actor("librarian").email, password }, "10.0.0.1");
    const change = () => refusal(changePassword(librarian, { current: "guess", next: "four red buoys" }, "10.0.7.1"));
    for (let i = 0; i < mostPerAccount; i++)
      expect(await change()).toMatchObject({
        code: "invalid_input",
        fields: { current: ["This is not the current password."] },
      });
    expect(await change()).toMatchObject({ code: "too_many_requests" });
  });

  test("is not for tokens", async () => {
    const error = await refusal(
      changePassword(actor("admin"), { current: password, next: "four red buoys" }, "10.0.0.1"),
    );
    expect(error).toMatchObject({ code: "forbidden" });
  });
});

describe("The cookie", () => {
  const headers = (entries: Record<string, string> = {}) => new Headers(entries);

  test("holds the session's key, sealed", async () => {
    const line = await sealedCookie("the key", headers());
    expect(line).toMatch(new RegExp(`^${cookieName}=[^;]+; Path=/; Max-Age=1209600; HttpOnly; SameSite=Lax$`));
    expect(line).not.toContain("the key");
    const sent = sentCookie(headers({ cookie: `theme=tar; ${line.split(";")[0]}; x=y` }));
    expect(await unsealedKey(sent ?? "")).toBe("the key");
  });

  test.each([
    ["an empty value", ""],
    ["something else", "not a seal"],
    ["a seal of another secret", "Fe26.2*1*8e2f*Zm9v*YmFy*1893456000000*aa*bb~2"],
  ])("tells nothing when it is %s", async (_, value) => {
    expect(await unsealedKey(value)).toBeUndefined();
  });

  test("tells nothing once a character of it has been changed", async () => {
    const sealed =
      sentCookie(headers({ cookie: (await sealedCookie("the key", headers())).split(";")[0] ?? "" })) ?? "";
    const other = sealed.at(60) === "A" ? "B" : "A";
    expect(await unsealedKey(sealed.slice(0, 60) + other + sealed.slice(61))).toBeUndefined();
  });

  test("goes over https only where the site is served by https", async () => {
    expect(await sealedCookie("key", headers({ "x-forwarded-proto": "https" }))).toContain("; Secure");
    expect(await sealedCookie("key", headers({ "x-forwarded-proto": "http" }))).not.toContain("Secure");
    vi.stubEnv("PUBLIC_URL", "https://ropewalk.example");
    expect(clearedCookie(headers())).toBe(`${cookieName}=; Path=/; Max-Age=0; HttpOnly; SameSite=Lax; Secure`);
    vi.stubEnv("PUBLIC_URL", "http://ropewalk.example");
    expect(await sealedCookie("key", headers({ "x-forwarded-proto": "https" }))).not.toContain("Secure");
    vi.unstubAllEnvs();
  });
});
