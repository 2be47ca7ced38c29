/** Hands one letter to the mail server. */
import { createTransport } from "nodemailer";
import { isMailAddress, oneLine, plainText } from "@/lib/mail/letter";
import type { MailSettings } from "@/lib/mail/settings";

export interface Letter {
  id: string;
  toAddress: string;
  subject: string;
  body: string;
  /** ISO 8601 */
  writtenAt: string;
}

/**
 * What came of it. `refused` is about this letter and final; `later` is about this letter and may pass; `away` is about
 * the server or our way in, so the letters behind this one need not be tried now.
 */
export type Outcome = { kind: "sent" } | { kind: "refused" | "later" | "away"; words: string };

/** How long a server may take, milliseconds. */
export interface Patience {
  /** to be reached, and to greet */
  connect: number;
  /** for any one silence */
  silence: number;
  /** for the whole letter */
  whole: number;
}

/** RFC 5321 section 4.5.3.2 would wait minutes at every step; nobody waits for us, but the letters behind do. */
export const usualPatience: Patience = { connect: 15_000, silence: 60_000, whole: 120_000 };

/** The message: its id is the letter's, so that one sent twice after a cut line is known for the same. */
function messageOf(letter: Letter, from: MailSettings["from"]) {
  const domain = from.address.slice(from.address.lastIndexOf("@") + 1);
  return {
    from,
    to: { name: "", address: letter.toAddress },
    envelope: { from: from.address, to: [letter.toAddress] },
    subject: oneLine(letter.subject, 200),
    text: plainText(letter.body, 20_000),
    date: new Date(letter.writtenAt),
    messageId: `<${letter.id}@${domain}>`,
    // Nobody answers a machine's letter by a machine: RFC 3834 section 5.
    headers: { "Auto-Submitted": "auto-generated" },
    disableFileAccess: true,
    disableUrlAccess: true,
  };
}

/** What nodemailer adds to its errors. */
interface MailError extends Error {
  response?: string;
  responseCode?: number;
  command?: string;
}

function failure(error: MailError): Outcome {
  const words = oneLine(error.response ?? error.message, 500);
  const isAboutLetter = error.command === "RCPT TO" || error.command === "DATA";
  if (!isAboutLetter || error.responseCode === undefined) return { kind: "away", words };
  return { kind: error.responseCode >= 500 ? "refused" : "later", words };
}

/** Never throws, and never takes longer than the whole patience. */
export async function sendLetter(
  settings: MailSettings,
  letter: Letter,
  patience: Patience = usualPatience,
): Promise<Outcome> {
  if (!isMailAddress(letter.toAddress)) return { kind: "refused", words: "This is not a mail address." };
  const { from, ...server } = settings;
  const transport = createTransport({
    ...server,
    ...{ connectionTimeout: patience.connect, greetingTimeout: patience.connect, dnsTimeout: patience.connect },
    ...{ socketTimeout: patience.silence, socketCloseTimeout: 1000 },
  });
  const signal = AbortSignal.timeout(patience.whole);
  try {
    await transport.sendMail({ ...messageOf(letter, from), signal });
    return { kind: "sent" };
  } catch (error) {
    if (signal.aborted)
      return { kind: "away", words: `The mail server took longer than ${patience.whole / 1000} seconds.` };
    return failure(error as MailError);
  } finally {
    transport.close();
  }
}
