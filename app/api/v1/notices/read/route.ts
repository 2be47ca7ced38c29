import { handle, route } from "@/lib/http/handle";
import { markRead } from "@/lib/notices/inbox/service";
import { readOwnNotices } from "@/lib/notices/operations";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  POST: handle(readOwnNotices, async ({ actor, body }) => Response.json({ unread: markRead(actor, await body()) })),
});
