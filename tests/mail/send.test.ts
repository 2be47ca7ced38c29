import { afterEach, describe, expect, test } from "vitest";
import { type Letter, sendLetter } from "@/lib/mail/send";
import type { MailSettings } from "@/lib/mail/settings";
import { deafAfter, mailServer, rawServer, refusal } from "@/tests/support/mail-server";

const letter: Letter = {
  ...{ id: "6f1c", toAddress: "ines@skerry-light.example", subject: "Skerry Light: C50-F10 was approved." },
  ...{ body: "C50-F10, revision 2, was approved.\n\nhttp://127.0.0.1:3000/cables/c50-f10\n" },
  writtenAt: "2026-03-01T12:00:00.000Z",
};
const patience = { connect: 300, silence: 300, whole: 900 };

const closers: (() => Promise<void>)[] = [];
afterEach(async () => {
  await Promise.all(closers.splice(0).map((close) => close()));
});
const kept = <T extends { close: () => Promise<void> }>(server: T): T => (closers.push(server.close), server);

const headerOf = (text: string) => text.slice(0, text.indexOf("\r\n\r\n"));

describe("A server that takes letters", () => {
  test("is given the letter: sender, receiver, subject, date, an id of its own, plain text", async () => {
    const { settings, received } = kept(await mailServer());
    expect(await sendLetter(settings, letter, patience)).toEqual({ kind: "sent" });
    const [first] = received;
    expect(first).toMatchObject({ from: "ropewalk@skerry-light.example", to: [letter.toAddress] });
    const header = headerOf(first?.text ?? "");
    expect(header).toMatch(/^From: Ropewalk <ropewalk@skerry-light\.example>$/m);
    expect(header).toMatch(/^To: ines@skerry-light\.example$/m);
    expect(header).toMatch(/^Subject: Skerry Light: C50-F10 was approved\.$/m);
    expect(header).toMatch(/^Message-ID: <6f1c@skerry-light\.example>$/m);
    expect(header).toMatch(/^Date: Sun, 01 Mar 2026 12:00:00 \+0000$/m);
    expect(header).toMatch(/^Auto-Submitted: auto-generated$/m);
    expect(header).toMatch(/^Content-Type: text\/plain/m);
    expect(first?.text).toContain("http://127.0.0.1:3000/cables/c50-f10");
  });

  test("is given no header and no receiver that a subject or an address smuggles in", async () => {
    const { settings, received } = kept(await mailServer());
    const subject = "Approved\r\nBcc: eve@elsewhere.example\r\n\r\nBuy this";
    expect(await sendLetter(settings, { ...letter, subject }, patience)).toEqual({ kind: "sent" });
    const header = headerOf(received[0]?.text ?? "");
    expect(header).not.toMatch(/^Bcc:/im);
    expect(header.match(/^Subject:/gm)).toHaveLength(1);
    expect(received[0]?.to).toEqual([letter.toAddress]);
    for (const toAddress of ["a@b.example, eve@elsewhere.example", "a@b.example\r\nRCPT TO:<eve@elsewhere.example>"])
      expect((await sendLetter(settings, { ...letter, toAddress }, patience)).kind).toBe("refused");
    expect(received).toHaveLength(1);
  });

  test("is given a lone full stop and long and foreign text as they are", async () => {
    const { settings, received } = kept(await mailServer());
    const body = `.\n..\nΩ ∠ √ für ${"x".repeat(2000)}\n.\n`;
    await sendLetter(settings, { ...letter, body, subject: "Ω geprüft" }, patience);
    const [, encoded = ""] = (received[0]?.text ?? "").split("\r\n\r\n");
    const isQuoted = /quoted-printable/i.test(headerOf(received[0]?.text ?? ""));
    const bytes = isQuoted
      ? Buffer.from(
          encoded
            .replaceAll("=\r\n", "")
            .replaceAll(/=([0-9A-F]{2})/g, (_, hex: string) => String.fromCharCode(parseInt(hex, 16))),
          "latin1",
        )
      : Buffer.from(encoded, "base64");
    expect(bytes.toString("utf8").replaceAll("\r\n", "\n").trimEnd()).toBe(body.trimEnd());
  });
});

describe("A server that refuses", () => {
  const onRcptTo = (code: number) => ({
    onRcptTo: (_: unknown, __: unknown, done: (error: Error) => void) => done(refusal(code, "no such box here")),
  });

  test("a receiver for good ends it, with the server's words", async () => {
    const { settings } = kept(await mailServer(onRcptTo(550)));
    expect(await sendLetter(settings, letter, patience)).toEqual({ kind: "refused", words: "550 no such box here" });
  });

  test("a receiver for now is asked again later", async () => {
    const { settings } = kept(await mailServer(onRcptTo(450)));
    expect(await sendLetter(settings, letter, patience)).toEqual({ kind: "later", words: "450 no such box here" });
  });

  test("the text after having read it is believed", async () => {
    const { settings } = kept(
      await mailServer({
        onData: (stream, _, done) => void stream.resume().on("end", () => done(refusal(554, "this is rubbish"))),
      }),
    );
    expect(await sendLetter(settings, letter, patience)).toEqual({ kind: "refused", words: "554 this is rubbish" });
  });

  test("our sender is one that is away: the letter is not at fault", async () => {
    const { settings } = kept(await mailServer({ onMailFrom: (_, __, done) => done(refusal(550, "who are you")) }));
    expect(await sendLetter(settings, letter, patience)).toEqual({ kind: "away", words: "550 who are you" });
  });
});

describe("A server that is not there", () => {
  const awayWithin = async (settings: MailSettings, mostMs: number) => {
    const before = Date.now();
    const outcome = await sendLetter(settings, letter, patience);
    expect(outcome).toMatchObject({ kind: "away", words: expect.stringMatching(/\w/) });
    expect(Date.now() - before).toBeLessThan(mostMs);
  };

  test("because nobody listens is said at once", async () => {
    const { settings, close } = await mailServer();
    await close();
    await awayWithin(settings, 800);
  });

  test.each([
    ["never greets", () => undefined],
    ["goes silent after the greeting", deafAfter("EHLO", () => undefined)],
    ["goes silent after the receiver", deafAfter("RCPT", () => undefined)],
    ["goes silent after the whole text", deafAfter(".", () => undefined)],
    ["cuts the line at the greeting", (socket: { destroy: () => void }) => socket.destroy()],
    ["cuts the line at the text", deafAfter("DATA", (socket) => void socket.destroy())],
    ["cuts the line after the whole text", deafAfter(".", (socket) => void socket.destroy())],
    ["talks nonsense", (socket: { write: (text: string) => void }) => socket.write("good morning\r\n".repeat(50))],
  ] as const)("because it %s ends in time", async (_, meet) => {
    const { settings } = kept(await rawServer(meet as Parameters<typeof rawServer>[0]));
    await awayWithin(settings, 2000);
  });

  test("because it drips a byte now and then ends after the whole patience", async () => {
    const drip = deafAfter("EHLO", (socket) => {
      const timer = setInterval(() => socket.write("250-x\r\n"), 50);
      socket.on("close", () => clearInterval(timer));
    });
    const { settings } = kept(await rawServer(drip));
    await awayWithin(settings, 2000);
  });
});
