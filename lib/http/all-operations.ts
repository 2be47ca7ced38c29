/** Every operation of the API, in the order of the description. */
import * as account from "@/lib/auth/operations";
import * as cables from "@/lib/cables/operations";
import * as evidence from "@/lib/cables/evidence/operations";
import * as files from "@/lib/cables/exchange/operations";
import * as lots from "@/lib/cables/lots/operations";
import * as compute from "@/lib/compute/operations";
import * as extract from "@/lib/compute/extract/operations";
import * as fit from "@/lib/compute/fit/operations";
import * as geometry from "@/lib/compute/geometry/operations";
import * as service from "@/lib/http/operations";
import * as readings from "@/lib/compute/readings/operations";
import * as touchstone from "@/lib/compute/touchstone/operations";
import type { Operation } from "@/lib/http/operation";
import * as limitLines from "@/lib/limit-lines/operations";
import * as mail from "@/lib/mail/operations";
import * as notices from "@/lib/notices/operations";
import * as reels from "@/lib/runs/reels/operations";
import * as runs from "@/lib/runs/operations";

export const operations: Operation[] = [
  account,
  cables,
  files,
  evidence,
  lots,
  runs,
  reels,
  limitLines,
  notices,
  mail,
  compute,
  geometry,
  fit,
  readings,
  extract,
  touchstone,
  service,
].flatMap((noun) => Object.values<Operation>(noun));
