// Preloaded into every process of the tests: a thread that a test starts loads our TypeScript without vitest around it.
import { isMainThread } from "node:worker_threads";
import { register } from "tsx/esm/api";

if (!isMainThread) register();
