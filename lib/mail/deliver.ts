/** Delivery of the letters that are due: a round at a time, one letter after the other, beside whatever the server does. */
import { settleLetter, takeLetter } from "@/lib/mail/outbox/service";
import { type Patience, sendLetter } from "@/lib/mail/send";
import { type MailSettings, mailSettings } from "@/lib/mail/settings";

const usualPauseMs = 10_000;
const longestPauseMs = 300_000;

/** What a round came to: how many letters were sent, and whether the mail server was away. */
export interface Round {
  sent: number;
  isAway: boolean;
}

/** Sends what is due. A server that is away ends the round, so that the letters behind keep their tries. */
export async function deliverDue(
  settings: MailSettings,
  now: () => number = Date.now,
  patience?: Patience,
): Promise<Round> {
  let sent = 0;
  for (let letter = takeLetter(now()); letter; letter = takeLetter(now())) {
    const outcome = await sendLetter(settings, letter, patience);
    settleLetter(letter, outcome, now());
    if (outcome.kind === "away") return { sent, isAway: true };
    if (outcome.kind === "sent") sent += 1;
  }
  return { sent, isAway: false };
}

/** The pause before the next round, milliseconds: twice the one before while the server is away, up to five minutes. */
export function pauseAfter({ isAway }: Round, pauseMs: number): number {
  return isAway ? Math.min(2 * pauseMs, longestPauseMs) : usualPauseMs;
}

/**
 * Begins to deliver, a round every ten seconds, never two at a time; does nothing where no mail server is set.
 * @returns ends it
 * @throws Error when the settings cannot be read
 */
export function startDelivery(): () => void {
  const settings = mailSettings();
  if (!settings) return () => undefined;
  let timer: NodeJS.Timeout;
  const later = (pauseMs: number) => {
    timer = setTimeout(() => void round(pauseMs), pauseMs);
    timer.unref();
  };
  const round = async (pauseMs: number) => {
    try {
      later(pauseAfter(await deliverDue(settings), pauseMs));
    } catch (error) {
      // The database was held by somebody else; what was taken comes back by itself.
      console.error("Letters could not be delivered:", error);
      later(usualPauseMs);
    }
  };
  later(usualPauseMs);
  return () => clearTimeout(timer);
}
