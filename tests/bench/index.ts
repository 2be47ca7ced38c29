/** `npm run bench`: how fast the product is, as ratios within one run. Nothing here fails a build; figures go into the notes. */
import { benchEngine } from "@/tests/bench/engine";
import { benchFirstLoad } from "@/tests/bench/first-load";
import { benchImport } from "@/tests/bench/import";
import { benchSearch } from "@/tests/bench/search";
import { benchTouchstone } from "@/tests/bench/touchstone";
import { row } from "@/tests/bench/timing";

row("", "ours", "other", "ratio");
benchEngine();
benchTouchstone();
await benchSearch();
await benchImport();
await benchFirstLoad();
