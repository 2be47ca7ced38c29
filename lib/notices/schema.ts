/** What people are told, on the wire. Pure. */
import { z } from "zod";
import { mostPerPage, nextCursorSchema, pageFields } from "@/lib/http/list";

export const noticeQuerySchema = z.strictObject({
  unread: z
    .literal("true", { error: "Say unread=true, or leave it out." })
    .optional()
    .describe("only those not read yet"),
  ...pageFields,
});
export type NoticeQuery = z.output<typeof noticeQuerySchema>;

export const noticeSchema = z
  .strictObject({
    id: z.string(),
    at: z.string().describe("ISO 8601"),
    kind: z.enum([
      ...["reviewAsked", "returned", "approved", "restricted", "quarantined"],
      ...["released", "superseded", "withdrawn", "reported", "settled"],
    ] as const),
    text: z.string().describe("a sentence"),
    link: z.string().describe("address within the product"),
    isRead: z.boolean(),
  })
  .meta({ id: "Notice" });
export type NoticeItem = z.infer<typeof noticeSchema>;

export const noticePageSchema = z
  .strictObject({
    items: z.array(noticeSchema),
    nextCursor: nextCursorSchema,
    total: z.int(),
    unread: z.int().describe("how many have not been read"),
  })
  .meta({ id: "NoticePage", description: "The latest first." });
export type NoticePage = z.infer<typeof noticePageSchema>;

const byName = z.strictObject({
  ids: z
    .array(z.string({ error: "An id is text." }).max(100, { error: "This is not an id of ours." }), {
      error: "Give the ids of the notices that were read as a list, or all: true.",
    })
    .min(1, { error: "Name at least one notice." })
    .max(mostPerPage, { error: `Name at most ${mostPerPage} notices at a time.` }),
});

const all = z.strictObject({
  all: z.literal(true, { error: "Say true." }),
  upTo: z.iso
    .datetime({ error: "A time as the notices have it, ISO 8601 in UTC." })
    .optional()
    .describe("leave those unread that came after this time, such as after the list was looked at"),
});

export const readingSchema = z
  .union([byName, all], { error: "Give either the ids of the notices that were read, or all: true." })
  .meta({ id: "ReadNotices" });
export type Reading = z.infer<typeof readingSchema>;

export const unreadSchema = z.strictObject({ unread: z.int().describe("how many have not been read") });
export type Unread = z.infer<typeof unreadSchema>;
