/** What can be asked of `/notices`. */
import { operation } from "@/lib/http/operation";
import { noticePageSchema, noticeQuerySchema, readingSchema, unreadSchema } from "@/lib/notices/schema";

export const listOwnNotices = operation({
  id: "listNotices",
  method: "GET",
  path: "/notices",
  summary: "One's own notices.",
  permission: "notices.own",
  query: noticeQuerySchema,
  answer: { status: 200, description: "A page of notices.", schema: noticePageSchema },
});

export const readOwnNotices = operation({
  id: "readNotices",
  method: "POST",
  path: "/notices/read",
  summary: "Mark notices of one's own as read, some or all; an id that is none of one's own changes nothing.",
  permission: "notices.own",
  body: readingSchema,
  answer: { status: 200, description: "What is left.", schema: unreadSchema },
});
