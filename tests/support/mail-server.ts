/** Mail servers on this machine for tests: one that works as told, and one that misbehaves below the protocol. */
import { type AddressInfo, createServer, type Server, type Socket } from "node:net";
import { SMTPServer, type SMTPServerOptions } from "smtp-server";
import type { MailSettings } from "@/lib/mail/settings";

export interface Received {
  from: string;
  to: string[];
  /** the message as it came over the line */
  text: string;
}

export interface MailServer {
  settings: MailSettings;
  received: Received[];
  close: () => Promise<void>;
}

const settingsFor = (port: number): MailSettings => ({
  ...{ host: "127.0.0.1", port, secure: false, requireTLS: false },
  from: { name: "Ropewalk", address: "ropewalk@skerry-light.example" },
});

/** A refusal with its code, as the server says it. */
export function refusal(responseCode: number, words: string): Error {
  return Object.assign(new Error(words), { responseCode });
}

/** A server that takes letters, but for what the hooks say. */
export async function mailServer(hooks: Partial<SMTPServerOptions> = {}): Promise<MailServer> {
  const received: Received[] = [];
  const server = new SMTPServer({
    ...{ disabledCommands: ["AUTH", "STARTTLS"], disableReverseLookup: true, logger: false },
    onData(stream, session, done) {
      const parts: Buffer[] = [];
      stream.on("data", (part: Buffer) => parts.push(part));
      stream.on("end", () => {
        const { mailFrom, rcptTo } = session.envelope;
        const from = mailFrom === false ? "" : mailFrom.address;
        received.push({ from, to: rcptTo.map(({ address }) => address), text: Buffer.concat(parts).toString() });
        done(null);
      });
    },
    ...hooks,
  });
  // A client that goes away in the middle is what some of the tests are about.
  server.on("error", () => undefined);
  await new Promise<void>((ready) => server.listen(0, "127.0.0.1", ready));
  return {
    settings: settingsFor((server.server.address() as AddressInfo).port),
    received,
    close: () => new Promise((closed) => server.close(() => closed())),
  };
}

/** A server that does as it likes with every connection; those left open are cut when it closes. */
export async function rawServer(meet: (socket: Socket) => void): Promise<Omit<MailServer, "received">> {
  const open = new Set<Socket>();
  const server: Server = createServer((socket) => {
    open.add(socket);
    socket.on("error", () => undefined);
    socket.on("close", () => open.delete(socket));
    meet(socket);
  });
  await new Promise<void>((ready) => server.listen(0, "127.0.0.1", ready));
  return {
    settings: settingsFor((server.address() as AddressInfo).port),
    close: () => {
      for (const socket of open) socket.destroy();
      return new Promise((closed) => server.close(() => closed()));
    },
  };
}

/** Talks as a mail server does until it gets a command that begins with `last`, and then does what it is told. */
export function deafAfter(last: string, then: (socket: Socket) => void): (socket: Socket) => void {
  return (socket) => {
    socket.write("220 skerry.example\r\n");
    let isData = false;
    socket.on("data", (bytes) => {
      const text = bytes.toString();
      if (isData ? text.endsWith(`${last}\r\n`) : text.startsWith(last)) return then(socket);
      if (isData) return;
      isData = text.startsWith("DATA");
      socket.write(isData ? "354 go on\r\n" : "250 ok\r\n");
    });
  };
}
