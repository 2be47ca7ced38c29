/** `npm run bench`: how fast the product is, as ratios within one run. Nothing here fails a build; figures go into the notes. */
import { benchEffects } from "@/tests/bench/effects";
import { benchEngine } from "@/tests/bench/engine";
import { benchFirstLoad } from "@/tests/bench/first-load";
import { benchMatchedLoss } from "@/tests/bench/matched-loss";
import { benchImport } from "@/tests/bench/import";
import { benchSearch } from "@/tests/bench/search";
import { benchTouchstone } from "@/tests/bench/touchstone";
import { benchStep } from "@/tests/bench/step";
import { benchTolerance } from "@/tests/bench/tolerance";
import { row } from "@/tests/bench/timing";

row("", "ours", "other", "ratio");
benchEngine();
benchTouchstone();
benchStep();
benchMatchedLoss();
benchTolerance();
benchEffects();
await benchSearch();
await benchImport();
await benchFirstLoad();
