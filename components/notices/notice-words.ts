import type { MarkedState } from "@/components/ui/state-mark";
import type { NoticeItem } from "@/lib/notices/schema";

/** What each kind of notice is called, and its mark. */
export const noticeWords: Record<NoticeItem["kind"], { mark: MarkedState; word: string }> = {
  reviewAsked: { mark: "none", word: "Review asked" },
  returned: { mark: "warn", word: "Returned" },
  approved: { mark: "pass", word: "Approved" },
  restricted: { mark: "warn", word: "Restricted" },
  quarantined: { mark: "fail", word: "Quarantined" },
  released: { mark: "pass", word: "Released" },
  superseded: { mark: "warn", word: "Superseded" },
  withdrawn: { mark: "fail", word: "Withdrawn" },
  reported: { mark: "warn", word: "Problem reported" },
  settled: { mark: "pass", word: "Settled" },
};
