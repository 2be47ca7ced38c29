/** Every operation of the API, in the order of the description. */
import * as account from "@/lib/auth/operations";
import * as said from "@/lib/cables/comments/operations";
import * as cables from "@/lib/cables/operations";
import * as dc from "@/lib/compute/dc/operations";
import * as evidence from "@/lib/cables/evidence/operations";
import * as files from "@/lib/cables/exchange/operations";
import * as lots from "@/lib/cables/lots/operations";
import * as queue from "@/lib/cables/queue/operations";
import * as revisions from "@/lib/cables/revisions/operations";
import * as steps from "@/lib/cables/steps/operations";
import * as waivers from "@/lib/cables/waivers/operations";
import * as extract from "@/lib/compute/extract/operations";
import * as fit from "@/lib/compute/fit/operations";
import * as geometry from "@/lib/compute/geometry/operations";
import * as compute from "@/lib/compute/operations";
import * as readings from "@/lib/compute/readings/operations";
import * as solve from "@/lib/compute/solve/operations";
import * as step from "@/lib/compute/step/operations";
import * as swap from "@/lib/compute/swap/operations";
import * as tolerance from "@/lib/compute/tolerance/operations";
import * as touchstone from "@/lib/compute/touchstone/operations";
import type { Operation } from "@/lib/http/operation";
import * as service from "@/lib/http/operations";
import * as limitLines from "@/lib/limit-lines/operations";
import * as mail from "@/lib/mail/operations";
import * as notices from "@/lib/notices/operations";
import * as reels from "@/lib/runs/reels/operations";
import * as effects from "@/lib/runs/effects/operations";
import * as runs from "@/lib/runs/operations";
import * as team from "@/lib/team/operations";

const nouns = [
  account,
  team,
  cables,
  files,
  evidence,
  lots,
  revisions,
  steps,
  said,
  waivers,
  queue,
  effects,
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
  step,
  tolerance,
  dc,
  swap,
  solve,
  service,
];

export const operations: Operation[] = nouns.flatMap((noun) => Object.values<Operation>(noun));
