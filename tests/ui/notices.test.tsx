import { cleanup, fireEvent, render, screen, waitFor, within } from "@testing-library/react";
import type { ReactNode } from "react";
import { afterEach, beforeEach, describe, expect, test, vi } from "vitest";
import { LetterList } from "@/components/notices/letter-list";
import { NoticeList } from "@/components/notices/notice-list";
import { NoticesLink } from "@/components/team/notices-link";
import { QueryProvider } from "@/components/team/query-provider";
import type { LetterPage } from "@/lib/mail/schema";
import type { NoticeItem, NoticePage } from "@/lib/notices/schema";

const told = (id: string, isRead: boolean, text = `Notice ${id}.`): NoticeItem => ({
  ...{ id, kind: "quarantined", text, link: `/cables/${id}`, isRead },
  at: `2026-03-01T12:0${id}:00.000Z`,
});

/** What the server holds; the network reads and changes it as the API does. */
let held: NoticeItem[];
let letters: LetterPage;
let answered: number;
let sent: { address: string; body: unknown }[];
const page = (): NoticePage => ({
  ...{ items: held, nextCursor: null, total: held.length },
  unread: held.filter(({ isRead }) => !isRead).length,
});

function serve(address: string, body: { ids?: string[]; all?: true }): unknown {
  if (address.includes("/team/letters")) {
    const state = /state=(\w+)/.exec(address)?.[1];
    const items = letters.items.filter((letter) => state === undefined || letter.state === state);
    return { ...letters, items, total: items.length };
  }
  if (address.endsWith("/read"))
    held = held.map((notice) => ({
      ...notice,
      isRead: notice.isRead || body.all === true || body.ids?.includes(notice.id) === true,
    }));
  return address.endsWith("/read") ? { unread: page().unread } : page();
}

beforeEach(() => {
  held = [told("3", false, "C75-F7 was quarantined: it disagrees with itself."), told("2", false), told("1", true)];
  sent = [];
  answered = 0;
  vi.stubGlobal("fetch", async (address: string, { method, body }: RequestInit) => {
    const given = typeof body === "string" ? (JSON.parse(body) as { ids?: string[] }) : {};
    if (method !== "GET") sent.push({ address, body: given });
    answered += 1;
    return Response.json(serve(address, given));
  });
});
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

const show = (what: ReactNode) => render(<QueryProvider>{what}</QueryProvider>);

describe("The way to one's notices", () => {
  test("says in words how many have not been read", async () => {
    show(<NoticesLink isCurrent={false} />);
    expect(await screen.findByRole("link", { name: "Notices 2 unread" })).toHaveProperty("pathname", "/notices");
  });

  test("says nothing of a number when all are read, nor while it is not known", async () => {
    held = [told("1", true)];
    show(<NoticesLink isCurrent />);
    const link = screen.getByRole("link", { name: "Notices" });
    expect(link.getAttribute("aria-current")).toBe("page");
    await waitFor(() => expect(answered).toBe(1));
    await Promise.resolve();
    expect(screen.getByRole("link", { name: "Notices" })).toBeTruthy();
  });

  test("counts no further than there is room for", async () => {
    held = Array.from({ length: 120 }, (_, i) => told(`${i}`, false));
    show(<NoticesLink isCurrent={false} />);
    expect(await screen.findByRole("link", { name: "Notices 99+ unread" })).toBeTruthy();
  });
});

describe("The notices", () => {
  const both = () =>
    show(
      <>
        <NoticesLink isCurrent />
        <NoticeList first={page()} />
      </>,
    );

  test("are sentences that lead to what they are about, with their kind and time, the unread ones told apart in words", () => {
    both();
    const [first, , last] = screen.getAllByRole("listitem");
    expect(first?.textContent).toContain("Quarantined");
    expect(first?.textContent).toContain("2026-03-01 12:03 UTC");
    const link = within(first!).getByRole("link", { name: /^Not read yet: ?C75-F7 was quarantined/ });
    expect(link).toHaveProperty("pathname", "/cables/3");
    expect(within(last!).getByRole("link", { name: "Notice 1." })).toBeTruthy();
    expect(screen.getByRole("status").textContent).toBe("2 not read yet");
  });

  test("are all read at a word, up to the latest that was shown, and the bar knows", async () => {
    both();
    await screen.findByRole("link", { name: "Notices 2 unread" });
    fireEvent.click(screen.getByRole("button", { name: "Mark all as read" }));
    await waitFor(() => expect(screen.getByRole("status").textContent).toBe("All read"));
    expect(sent).toEqual([{ address: "/api/v1/notices/read", body: { all: true, upTo: "2026-03-01T12:03:00.000Z" } }]);
    expect(screen.getByRole("link", { name: "Notices" })).toBeTruthy();
    expect(screen.getByRole("button", { name: /Mark all as read/ }).getAttribute("aria-disabled")).toBe("true");
  });

  test("are read one by one by opening what they are about", async () => {
    both();
    fireEvent.click(screen.getByRole("link", { name: /C75-F7/ }));
    await waitFor(() => expect(screen.getByRole("status").textContent).toBe("1 not read yet"));
    expect(sent.map(({ body }) => body)).toEqual([{ ids: ["3"] }]);
  });

  test("say what will stand there when there is none", () => {
    held = [];
    both();
    expect(screen.getByText(/Nothing to tell you yet/)).toBeTruthy();
    expect(screen.queryByRole("button")).toBeNull();
  });

  test("that could not be marked stay unread, with the reason", async () => {
    both();
    const detail = "Somebody else is writing just now.";
    vi.stubGlobal("fetch", async () =>
      Response.json(
        { title: "Busy", status: 503, detail },
        { status: 503, headers: { "Content-Type": "application/problem+json" } },
      ),
    );
    fireEvent.click(screen.getByRole("button", { name: "Mark all as read" }));
    expect(await screen.findByText(new RegExp(detail))).toBeTruthy();
    expect(screen.getByRole("status").textContent).toBe("2 not read yet");
  });
});

describe("The letters", () => {
  beforeEach(() => {
    const letter = { toAddress: "ines@quay.example", subject: "Quay: C75-F7", body: "Read\nthis.", sentAt: null };
    letters = {
      items: [
        {
          ...letter,
          id: "b",
          writtenAt: "2026-03-01T12:00:00.000Z",
          state: "givenUp",
          tries: 3,
          nextTryAt: null,
          error: "550 no such box",
        },
        {
          ...letter,
          id: "a",
          writtenAt: "2026-03-01T11:00:00.000Z",
          state: "waiting",
          tries: 0,
          nextTryAt: null,
          error: null,
        },
      ],
      ...{ nextCursor: null, total: 2, hasMailServer: false },
    };
  });

  test("say to whom, what became of them, and the server's words; and that none goes out without a server", () => {
    show(<LetterList first={letters} />);
    expect(screen.getByText(/No mail server is set/)).toBeTruthy();
    const [givenUp, waiting] = screen.getAllByRole("listitem");
    expect(givenUp?.textContent).toMatch(/Given up.*ines@quay\.example.*tried 3 times.*550 no such box/);
    expect(waiting?.textContent).toMatch(/Waiting.*not tried yet/);
  });

  test("are told apart by their state", async () => {
    show(<LetterList first={{ ...letters, hasMailServer: true }} />);
    expect(screen.queryByText(/No mail server is set/)).toBeNull();
    fireEvent.change(screen.getByLabelText("State"), { target: { value: "sent" } });
    expect(await screen.findByText("None.")).toBeTruthy();
    fireEvent.change(screen.getByLabelText("State"), { target: { value: "givenUp" } });
    await waitFor(() => expect(screen.getAllByRole("listitem")).toHaveLength(1));
  });
});
