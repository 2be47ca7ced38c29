import { mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { asc, eq } from "drizzle-orm";
import { afterAll, afterEach, beforeEach, describe, expect, test, vi } from "vitest";
import { database, openDatabase, replaceDatabase } from "@/db/client";
import { letters } from "@/db/schema/notices";
import { deliverDue, pauseAfter, startDelivery } from "@/lib/mail/deliver";
import { takeLetter } from "@/lib/mail/outbox/service";
import { mostTries } from "@/lib/mail/pauses";
import { notify } from "@/lib/notices/service";
import { withDatabase } from "@/tests/support/database";
import { deafAfter, mailServer, rawServer, refusal } from "@/tests/support/mail-server";
import { actor, addPeople, home } from "@/tests/support/people";

withDatabase(() => addPeople());
beforeEach(() => void database().delete(letters).run());

const closers: (() => Promise<void>)[] = [];
afterEach(async () => {
  await Promise.all(closers.splice(0).map((close) => close()));
});
const kept = <T extends { close: () => Promise<void> }>(server: T): T => (closers.push(server.close), server);

const start = Date.parse("2026-03-01T12:00:00.000Z");
const day = 86_400_000;
const patience = { connect: 200, silence: 200, whole: 600 };

function write(count: number, toAddress = "ines@skerry-light.example"): void {
  for (let i = 0; i < count; i++)
    database()
      .insert(letters)
      .values({
        ...{ id: `letter-${i}`, teamId: home.id, toAddress, subject: `Letter ${i}`, body: "Read this.\n" },
        ...{ state: "waiting", writtenAt: new Date(start).toISOString(), nextTryAt: new Date(start).toISOString() },
      })
      .run();
}
const stored = () => database().select().from(letters).orderBy(asc(letters.id)).all();

describe("What is due", () => {
  test("is sent once, and stays as sent", async () => {
    const { settings, received } = kept(await mailServer());
    write(3);
    expect(await deliverDue(settings, () => start)).toEqual({ sent: 3, isAway: false });
    expect(await deliverDue(settings, () => start + 30 * day)).toEqual({ sent: 0, isAway: false });
    expect(received).toHaveLength(3);
    for (const letter of stored())
      expect(letter).toMatchObject({ state: "sent", tries: 1, error: null, sentAt: new Date(start).toISOString() });
  });

  test("is what notify wrote, with a link that begins at PUBLIC_URL", async () => {
    const { settings, received } = kept(await mailServer());
    vi.stubEnv("PUBLIC_URL", "https://ropewalk.skerry-light.example/");
    const text = "C50-F10 was restricted:\r\nBcc: eve@elsewhere.example";
    notify(actor("librarian"), [actor("designer").personId], { kind: "restricted", text, link: "/cables/c50-f10" });
    vi.unstubAllEnvs();
    expect((await deliverDue(settings)).sent).toBe(1);
    expect(received[0]?.to).toEqual([actor("designer").email]);
    expect(received[0]?.text).toContain("https://ropewalk.skerry-light.example/cables/c50-f10");
    expect(received[0]?.text).toMatch(/^Subject: Skerry Light: C50-F10 was restricted: Bcc:/m);
    expect(received[0]?.text.split("\r\n\r\n")[0]).not.toMatch(/^Bcc/m);
  });

  test("is not what lies in the future", async () => {
    const { settings, received } = kept(await mailServer());
    write(1);
    await deliverDue(settings, () => start - 1);
    expect(received).toEqual([]);
  });
});

describe("Two that deliver from one outbox", () => {
  test("send each letter once", async () => {
    const { settings, received } = kept(await mailServer());
    write(12);
    const rounds = await Promise.all([deliverDue(settings, () => start), deliverDue(settings, () => start)]);
    expect(rounds.map(({ sent }) => sent).reduce((a, b) => a + b)).toBe(12);
    expect(rounds.every(({ sent }) => sent > 0)).toBe(true);
    const subjects = received.map(({ text }) => /^Subject: (.*)$/m.exec(text)?.[1]);
    expect(new Set(subjects).size).toBe(12);
    expect(received).toHaveLength(12);
  });

  test("do not take one from another process's hands", () => {
    const folder = mkdtempSync(path.join(tmpdir(), "ropewalk-mail-"));
    const before = database();
    const file = path.join(folder, "outbox.db");
    before.$client.prepare("vacuum into ?").run(file);
    const [one, two] = [openDatabase(file), openDatabase(file)];
    try {
      replaceDatabase(one);
      write(1);
      expect(takeLetter(start)?.id).toBe("letter-0");
      replaceDatabase(two);
      expect(takeLetter(start + 60_000)).toBeUndefined();
      // Whoever took it has died: it comes back by itself.
      expect(takeLetter(start + 3_600_000)).toMatchObject({ id: "letter-0", tries: 2 });
    } finally {
      replaceDatabase(before);
      for (const each of [one, two]) each.$client.close();
      rmSync(folder, { recursive: true });
    }
  });
});

describe("A letter that is refused", () => {
  test("for good is given up with the server's words, and those behind it go on", async () => {
    const { settings, received } = kept(
      await mailServer({
        onRcptTo: ({ address }, _, done) => done(address.startsWith("gone") ? refusal(550, "gone away") : null),
      }),
    );
    write(2);
    database().update(letters).set({ toAddress: "gone@quay.example" }).where(eq(letters.id, "letter-0")).run();
    expect(await deliverDue(settings, () => start)).toEqual({ sent: 1, isAway: false });
    expect(stored()).toMatchObject([{ state: "givenUp", tries: 1, error: "550 gone away" }, { state: "sent" }]);
    expect(received).toHaveLength(1);
  });

  test("for now is tried again after growing pauses, and given up in the end with the server's last words", async () => {
    let tries = 0;
    const { settings } = kept(
      await mailServer({ onRcptTo: (_, __, done) => done(refusal(451, `busy, try ${++tries}`)) }),
    );
    write(1);
    let now = start;
    const pauses: number[] = [];
    while (stored()[0]?.state === "waiting") {
      await deliverDue(settings, () => now);
      const [letter] = stored();
      if (letter?.state !== "waiting") break;
      const next = Date.parse(letter.nextTryAt);
      pauses.push(next - now);
      await deliverDue(settings, () => next - 1);
      now = next;
    }
    expect(stored()[0]).toMatchObject({ state: "givenUp", tries: mostTries, error: `451 busy, try ${mostTries}` });
    expect(tries).toBe(mostTries);
    expect(pauses).toEqual([...pauses].sort((a, b) => a - b));
    expect(now - start).toBeGreaterThan(4 * day);
    await deliverDue(settings, () => now + 365 * day);
    expect(tries).toBe(mostTries);
  });
});

describe("A server that is away", () => {
  test("costs the first letter a try, and those behind it none", async () => {
    const { settings } = kept(await rawServer(() => undefined));
    write(3);
    expect(await deliverDue(settings, () => start, patience)).toEqual({ sent: 0, isAway: true });
    expect(stored().map(({ tries }) => tries)).toEqual([1, 0, 0]);
    expect(stored()[0]?.error).toMatch(/\w/);
  });

  test("and dies with the text half read has the letter again when it is back, under the same id", async () => {
    const dying = await rawServer(
      deafAfter("DATA", (socket) => void socket.write("354 go on\r\n", () => socket.destroy())),
    );
    write(1);
    expect(await deliverDue(dying.settings, () => start, patience)).toEqual({ sent: 0, isAway: true });
    await dying.close();
    const { settings, received } = kept(await mailServer());
    expect((await deliverDue(settings, () => start + 60_000)).sent).toBe(1);
    expect(received[0]?.text).toMatch(/^Message-ID: <letter-0@/m);
    expect(stored()).toMatchObject([{ state: "sent", tries: 2, error: null }]);
  });

  test("is asked less and less often, at least every five minutes, and as usual once it is back", () => {
    let pause = 10_000;
    const pauses = Array.from({ length: 8 }, () => (pause = pauseAfter({ sent: 0, isAway: true }, pause)));
    expect(pauses).toEqual([20_000, 40_000, 80_000, 160_000, 300_000, 300_000, 300_000, 300_000]);
    expect(pauseAfter({ sent: 1, isAway: false }, pause)).toBe(10_000);
  });

  test("holds nobody up: whoever tells people waits for no mail", async () => {
    const { settings } = kept(await rawServer(() => undefined));
    write(1);
    const round = deliverDue(settings, () => start, patience);
    const before = performance.now();
    notify(actor("librarian"), [actor("designer").personId], { kind: "approved", text: "Approved.", link: "/runs" });
    expect(performance.now() - before).toBeLessThan(100);
    await round;
  });
});

describe("Delivery in the server", () => {
  afterAll(() => vi.useRealTimers());

  test("does not begin where no mail server is set", () => {
    vi.stubEnv("SMTP_URL", "");
    vi.stubEnv("MAIL_FROM", "");
    vi.useFakeTimers();
    startDelivery();
    expect(vi.getTimerCount()).toBe(0);
    vi.useRealTimers();
    vi.unstubAllEnvs();
  });

  test("is refused where the settings cannot be read", () => {
    vi.stubEnv("SMTP_URL", "smtp://mail.quay.example");
    expect(() => startDelivery()).toThrow(/MAIL_FROM/);
    vi.unstubAllEnvs();
  });

  test("begins a round after ten seconds, and ends when told", async () => {
    const { settings, received } = kept(await mailServer());
    vi.stubEnv("SMTP_URL", `smtp://127.0.0.1:${settings.port}`);
    vi.stubEnv("MAIL_FROM", "ropewalk@skerry-light.example");
    write(1);
    vi.useFakeTimers({ toFake: ["setTimeout", "clearTimeout"] });
    const end = startDelivery();
    vi.advanceTimersByTime(10_000);
    vi.useRealTimers();
    await vi.waitFor(() => expect(stored()[0]?.state).toBe("sent"));
    end();
    expect(received).toHaveLength(1);
    vi.unstubAllEnvs();
  });
});
