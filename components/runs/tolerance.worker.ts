/** Draws in a thread of its own, so that the page stays free. A request comes in, news go out; to stop it, end it. */
import type { ToleranceRequest } from "@/lib/line/tolerance";
import { workThrough } from "@/lib/runs/tolerance-work";

addEventListener("message", ({ data }: MessageEvent<ToleranceRequest>) => {
  workThrough(data, (news) => postMessage(news));
});
